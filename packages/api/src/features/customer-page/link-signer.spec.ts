import { LinkSigner } from './link-signer.js';

const ID = '0193e000-0000-7000-8000-00000000abcd';

describe('the tokens of customers’ links', () => {
  const signer = new LinkSigner('a secret of at least thirty-two characters');
  const token = signer.tokenOf(ID);

  it('carry the id of the link, fit for an address', () => {
    expect(token).toMatch(/^[\w-]{64}$/);
    expect(signer.idIn(token)).toBe(ID);
  });

  it('are refused with any one character changed', () => {
    for (let place = 0; place < token.length; place += 1) {
      const changed = token[place] === 'A' ? 'B' : 'A';
      expect(signer.idIn(token.slice(0, place) + changed + token.slice(place + 1))).toBeNull();
    }
  });

  it('are refused when cut, stretched, empty or signed with another secret', () => {
    const other = new LinkSigner('another secret of thirty-two characters or so');
    for (const bad of ['', token.slice(1), `${token}A`, 'x'.repeat(64), other.tokenOf(ID), '%'.repeat(64)])
      expect(signer.idIn(bad)).toBeNull();
  });
});
