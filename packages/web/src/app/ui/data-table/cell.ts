import { Directive, inject, input, TemplateRef } from '@angular/core';

/**
 * A cell's own template: `<ng-template bmCell="status" [bmCellOf]="rows()" let-row>`. The rows only give the template
 * its type.
 */
@Directive({ selector: 'ng-template[bmCell]' })
export class Cell<Row> {
  readonly bmCell = input.required<string>();
  readonly bmCellOf = input.required<readonly Row[]>();
  readonly template = inject<TemplateRef<{ $implicit: Row }>>(TemplateRef);

  static ngTemplateContextGuard<Row>(_: Cell<Row>, context: unknown): context is { $implicit: Row } {
    return context !== null;
  }
}
