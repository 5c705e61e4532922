import { inject } from '@angular/core';
import { MatIconRegistry } from '@angular/material/icon';
import { DomSanitizer } from '@angular/platform-browser';

/** Our one set of icons, a sprite that this site serves: `<mat-icon svgIcon="jobs" />`. */
export function registerIcons(): void {
  const sprite = inject(DomSanitizer).bypassSecurityTrustResourceUrl('/icons.svg');
  inject(MatIconRegistry).addSvgIconSet(sprite);
}
