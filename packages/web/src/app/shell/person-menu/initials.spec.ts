import { initialsOf } from './initials';

describe('initialsOf', () => {
  it.each([
    ['Ada Fenwick', 'AF'],
    ['Ada', 'A'],
    ['  Ada  Maria Fenwick ', 'AF'],
    ['ångström öst', 'ÅÖ'],
    ['', ''],
  ])('%s', (name, initials) => {
    expect(initialsOf(name)).toBe(initials);
  });
});
