import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { LEAD_STAGE_NAMES } from '@bookmatch/common/leads/lead-stages';
import { LEAD_SOURCE_NAMES } from '@bookmatch/common/leads/lead-words';
import { LEAD_SOURCES, LEAD_STAGES } from '@bookmatch/common/leads/leads-contract';
import type { ListAddress } from '../../platform/lists/list-address';
import { ChoiceField } from '../../ui/choice-field/choice-field';
import { SearchField } from '../../ui/search-field/search-field';

/** Search and filters of the list and the board, kept in the address. The board has a column for every stage. */
@Component({
  selector: 'bm-lead-filters',
  imports: [ChoiceField, SearchField],
  template: `
    <bm-search-field
      label="Search leads"
      [value]="address().query()['q'] ?? ''"
      (searched)="address().search($event)"
    />
    @if (withStage()) {
      <bm-choice-field
        label="Stage"
        [choices]="stages"
        [value]="address().query()['stage'] ?? ''"
        (chosen)="address().filterBy('stage', $event)"
      />
    }
    <bm-choice-field
      label="Next step"
      [choices]="steps"
      [value]="address().query()['nextStep'] ?? ''"
      (chosen)="address().filterBy('nextStep', $event)"
    />
    <bm-choice-field
      label="Source"
      [choices]="sources"
      [value]="address().query()['source'] ?? ''"
      (chosen)="address().filterBy('source', $event)"
    />
  `,
  styles: ':host { display: contents; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LeadFilters {
  readonly address = input.required<ListAddress>();
  readonly withStage = input(false);

  protected readonly stages = [
    { value: '', name: 'Open leads' },
    ...LEAD_STAGES.map((value) => ({ value, name: LEAD_STAGE_NAMES[value] })),
    { value: 'all', name: 'All leads' },
  ];
  protected readonly steps = [
    { value: '', name: 'Any next step' },
    { value: 'overdue', name: 'Overdue' },
    { value: 'due', name: 'Due by today' },
    { value: 'none', name: 'No next step' },
  ];
  protected readonly sources = [
    { value: '', name: 'Every source' },
    ...LEAD_SOURCES.map((value) => ({ value, name: LEAD_SOURCE_NAMES[value] })),
  ];
}
