import type { Provider } from '@angular/core';
import { MatIconRegistry } from '@angular/material/icon';
import { of } from 'rxjs';

/** Icons for component tests: every name is there, none is fetched. */
export function provideIcons(): Provider {
  const empty = (): SVGElement => document.createElementNS('http://www.w3.org/2000/svg', 'svg');
  return {
    provide: MatIconRegistry,
    useValue: {
      getNamedSvgIcon: () => of(empty()),
      getDefaultFontSetClass: () => [],
      addSvgIconSet: () => undefined,
    },
  };
}
