/** Something that should be so; `faults` says where it is not, and is empty when all is well. */
export type Finding = { name: string; faults: string[] };

/** Whether two amounts that are counted on different ways are the same. */
export function same(name: string, counted: number, expected: number): Finding {
  return { name, faults: counted === expected ? [] : [`${counted} is not ${expected}`] };
}

/** What a list of things has wrong, each named. */
export function none(name: string, faults: readonly string[]): Finding {
  return { name, faults: [...faults] };
}
