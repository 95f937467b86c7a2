import { type OperationInput, type OperationName, operations } from '../contract/operations.ts';
import { Problem } from '../problems/problem.ts';

/** An operation's input once its check has run. Throws 'bad-input' that names the first fault and where it stands. */
export function checkInput<Name extends OperationName>(name: Name, input: unknown): OperationInput<Name> {
  if (!Object.hasOwn(operations, name)) throw new Problem('bad-input', `There is no operation called '${name}'.`);
  const checked = operations[name].input.safeParse(input);
  if (checked.success) return checked.data as OperationInput<Name>;
  const { path, message } = checked.error.issues[0];
  throw new Problem('bad-input', `${name} cannot be asked like this: ${message}`, {
    part: path.length > 0 ? path.join('.') : 'input',
  });
}
