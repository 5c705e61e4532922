import { localPath, routerBaseOf, shopSlugOf } from './address';

describe('the shop of an address', () => {
  it.each([
    ['/s/northgrain/jobs/7', 'northgrain', '/s/northgrain/'],
    ['/s/northgrain', 'northgrain', '/s/northgrain/'],
    ['/sign-in', null, '/'],
    ['/s/', null, '/'],
    ['/s/UPPER/', null, '/'],
    ['/settings/s/x', null, '/'],
  ])('%s', (path, slug, base) => {
    expect(shopSlugOf(path)).toBe(slug);
    expect(routerBaseOf(path)).toBe(base);
  });
});

describe('localPath', () => {
  const ORIGIN = 'https://shop.example.test';

  it('goes where it was asked to at home', () => {
    expect(localPath('/s/northgrain/jobs?q=a#b', '/', ORIGIN)).toBe('/s/northgrain/jobs?q=a#b');
  });

  it.each([
    'https://elsewhere.test/',
    '//elsewhere.test/x',
    '/\\elsewhere.test',
    '/\t/elsewhere.test',
    'javascript:alert(1)',
    '',
    null,
  ])('never leaves home: %s', (asked) => {
    expect(localPath(asked, '/', ORIGIN)).toBe('/');
  });
});
