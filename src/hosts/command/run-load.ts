import type { NewsLine } from '../../contract/news.ts';
import type { FileFate } from '../../contract/values.ts';
import type { Desk } from '../../operations/desk.ts';
import { atDesk } from './at-desk.ts';
import type { Terminal } from './terminal.ts';
import type { Words } from './words.ts';

/** Stores files and folders, with progress on stderr and each file's fate on stdout. An interrupt stops it in order. */
export async function runLoad({ given, archivePath }: Words, terminal: Terminal): Promise<number> {
  if (given.length === 0) {
    terminal.stderr.write('Name the files or folders to load: crosstrack load FILE|FOLDER... [--archive PATH]\n');
    return 2;
  }
  const { fates, wasStopped } = await atDesk(archivePath, (desk) => loadAll(desk, given, terminal));
  const isWhole = fates.every(({ fate }) => fate === 'loaded' || fate === 'already there');
  return isWhole && fates.length > 0 && !wasStopped ? 0 : 1;
}

interface Outcome {
  fates: FileFate[];
  wasStopped: boolean;
}

function loadAll(desk: Desk, paths: string[], terminal: Terminal): Promise<Outcome> {
  return new Promise((resolve, reject) => {
    const fates: FileFate[] = [];
    const stopLoading = () => desk.perform('stopTask', { taskId }).catch(reject);
    let taskId = 0;
    desk.hearNews((line) => {
      if (line.kind === 'load progress') terminal.stderr.write(describeProgress(line));
      if (line.kind === 'file fate') {
        fates.push(line.fate);
        terminal.stdout.write(describeFate(line.fate));
      }
      if (line.kind !== 'load ended') return;
      if (line.wasStopped) terminal.stderr.write('Loading was stopped; what is listed above is stored.\n');
      terminal.removeListener('SIGINT', stopLoading);
      resolve({ fates, wasStopped: line.wasStopped });
    });
    desk.perform('loadPaths', { paths }).then((answer) => {
      taskId = answer.taskId;
      terminal.once('SIGINT', stopLoading);
    }, reject);
  });
}

function describeProgress(line: Extract<NewsLine, { kind: 'load progress' }>): string {
  const share = line.bytesTotal > 0 ? Math.floor((100 * line.bytesDone) / line.bytesTotal) : 100;
  return `${String(share).padStart(3)} %  file ${line.filesDone + 1} of ${line.filesTotal}: ${line.file}\n`;
}

function describeFate({ file, fate, passIds, problems }: FileFate): string {
  const passes = passIds.length > 0 ? ` as pass ${passIds.join(', ')}` : '';
  const told = problems.map(({ code, message, where }) => `  ${message} (${where}) [${code}]\n`);
  return `${file}: ${fate}${passes}\n${told.join('')}`;
}
