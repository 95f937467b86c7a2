import { make } from '../shared/make.ts';
import { loadingWords as words } from './words.ts';

/** Takes files and folders dropped anywhere in the window; while they hover, a sheet over the window says so. */
export function takeDroppedFiles(onFiles: (files: File[]) => void): HTMLElement {
  const sheet = make('div', { class: 'drop-sheet', hidden: true }, make('p', {}, words.drop));
  let inside = 0;
  const show = (isOver: boolean) => {
    sheet.hidden = !isOver;
    if (!isOver) inside = 0;
  };
  window.addEventListener('dragenter', (event) => {
    if (!event.dataTransfer?.types.includes('Files')) return;
    event.preventDefault();
    inside++;
    show(true);
  });
  window.addEventListener('dragleave', () => {
    inside--;
    if (inside <= 0) show(false);
  });
  window.addEventListener('dragover', (event) => event.preventDefault());
  window.addEventListener('drop', (event) => {
    event.preventDefault();
    show(false);
    if (event.dataTransfer) void collectFiles(event.dataTransfer).then(onFiles);
  });
  return sheet;
}

async function collectFiles(dropped: DataTransfer): Promise<File[]> {
  const plain = [...dropped.files];
  const entries = [...dropped.items].map((item) => item.webkitGetAsEntry()).filter((entry) => entry !== null);
  if (!entries.some((entry) => entry.isDirectory)) return plain;
  return (await Promise.all(entries.map(readEntry))).flat();
}

async function readEntry(entry: FileSystemEntry): Promise<File[]> {
  if (entry.isFile)
    return [await new Promise<File>((resolve, reject) => (entry as FileSystemFileEntry).file(resolve, reject))];
  const reader = (entry as FileSystemDirectoryEntry).createReader();
  const children: FileSystemEntry[] = [];
  // A reader hands out its entries in batches, and says it has ended by an empty one.
  for (;;) {
    const batch = await new Promise<FileSystemEntry[]>((resolve, reject) => reader.readEntries(resolve, reject));
    if (batch.length === 0) break;
    children.push(...batch);
  }
  return (await Promise.all(children.map(readEntry))).flat();
}
