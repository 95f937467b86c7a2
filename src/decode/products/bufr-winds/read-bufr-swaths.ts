import { Problem, toProblem } from '../../../problems/problem.ts';
import type { Swath } from '../../../swath/swath.ts';
import { type FoundMessage, findMessages } from '../../containers/bufr/find-messages.ts';
import type { ReadSwaths } from '../../read-swaths.ts';
import { readPasses } from './read-passes.ts';
import { type SurveyedMessage, surveyMessage } from './survey-message.ts';

/**
 * Reads the scatterometer passes of a BUFR file. What could not be read is never thrown: it is told in `problems`, with
 * the message and the byte, beside what could.
 */
export function readBufrSwaths(bytes: Uint8Array, fileName: string): ReadSwaths {
  const { messages, problems } = findMessages(bytes);
  const surveyed: SurveyedMessage[] = [];
  const swaths: Swath[] = [];
  const attempt = (part: string | undefined, action: () => void) => {
    try {
      action();
    } catch (thrown) {
      problems.push(toProblem(thrown, part ? { part } : {}));
    }
  };
  for (const message of messages) attempt(message.part, () => surveyed.push(surveyMessage(bytes, message)));
  const groups = Map.groupBy(surveyed, ({ viewing, flagDescriptor }) => `${viewing} ${flagDescriptor}`);
  for (const group of groups.values()) attempt(undefined, () => swaths.push(...readPasses(bytes, group, problems)));
  if (swaths.length === 0 && problems.length === 0) problems.push(nothingFound(messages));
  return {
    format: describeFormat(messages),
    swaths,
    problems: problems.map((problem) => problem.at({ file: fileName })),
  };
}

function nothingFound(messages: readonly FoundMessage[]): Problem {
  if (messages.length === 0) return new Problem('unknown-format', 'The file holds no BUFR message.');
  return new Problem('no-cells', 'The messages of the file hold no cells.');
}

/** 'BUFR edition 4', or 'BUFR editions 3 and 4' where a file mixes them. */
function describeFormat(messages: readonly FoundMessage[]): string {
  const editions = [...new Set(messages.map(({ edition }) => edition))].sort();
  if (editions.length === 0) return 'BUFR';
  return `BUFR edition${editions.length > 1 ? 's' : ''} ${editions.join(' and ')}`;
}
