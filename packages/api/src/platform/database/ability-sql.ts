import { rulesToAST } from '@casl/ability/extra';
import type { Ability, Action, Subject } from '@bookmatch/common/access/ability';

/** How one field of a rule's conditions is asked in SQL: the parameter's name in, "this field has that value" out. */
export type SqlFields = Record<string, (parameter: string) => string>;
export type SqlCondition = { sql: string; parameters: Record<string, unknown> };

type Node = { operator: string; value: unknown; field?: string };

/**
 * The rows of a subject that an ability allows an action on, as an SQL condition for lists. What nothing grants is no
 * rows at all, never all of them.
 *
 * @throws TypeError on an operator or field that is not known here: a rule that cannot be asked must not be skipped
 */
export function abilitySql(ability: Ability, action: Action, of: Subject, fields: SqlFields): SqlCondition {
  const ast = rulesToAST(ability, action, of);
  if (ast === null) return { sql: '1 = 0', parameters: {} };
  const parameters: Record<string, unknown> = {};
  const sql = write(ast, fields, (value) => {
    const name = `granted${Object.keys(parameters).length}`;
    parameters[name] = value;
    return `:${name}`;
  });
  return { sql, parameters };
}

type Bind = (value: unknown) => string;

function write(node: Node, fields: SqlFields, bind: Bind): string {
  switch (node.operator) {
    case 'and':
      return together(node, ' and ', '1 = 1', fields, bind);
    case 'or':
      return together(node, ' or ', '1 = 0', fields, bind);
    case 'eq':
      return field(node, fields)(bind(scalar(node.value)));
    case 'in':
      return anyOf((node.value as unknown[]).map((value) => field(node, fields)(bind(scalar(value)))));
    default:
      throw new TypeError(`A rule's operator ${node.operator} has no SQL.`);
  }
}

function together(node: Node, glue: string, none: string, fields: SqlFields, bind: Bind): string {
  const parts = (node.value as Node[]).map((part) => write(part, fields, bind));
  return parts.length === 0 ? none : `(${parts.join(glue)})`;
}

function anyOf(parts: string[]): string {
  return parts.length === 0 ? '1 = 0' : `(${parts.join(' or ')})`;
}

function field(node: Node, fields: SqlFields): (parameter: string) => string {
  const ask = node.field === undefined || !Object.hasOwn(fields, node.field) ? undefined : fields[node.field];
  if (!ask) throw new TypeError(`A rule's field ${String(node.field)} has no SQL.`);
  return ask;
}

/** `= null` is never true in SQL, and a list is no value: both would change what the rule means. */
function scalar(value: unknown): unknown {
  if (['string', 'number', 'boolean'].includes(typeof value)) return value;
  throw new TypeError('A rule compares with a text, a number or a flag.');
}
