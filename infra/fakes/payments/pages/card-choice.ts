import { TEST_CARDS } from '../cards.js';
import { html, type Html } from './html.js';

/** The test cards to choose from; `chosen` is the one kept after an error. What is paid once has no renewal. */
export function cardChoice(chosen: string, renews: boolean): Html {
  const offered = TEST_CARDS.filter((card) => renews || card.name !== 'fails-later');
  const radios = offered.map((card) => {
    const checked = card.name === chosen ? html` checked` : null;
    return html`<label
      ><input type="radio" name="card" value="${card.name}" ${checked} required /> ${card.label}</label
    > `;
  });
  return html`<fieldset>
    <legend>Card</legend>
    ${radios}
  </fieldset>`;
}
