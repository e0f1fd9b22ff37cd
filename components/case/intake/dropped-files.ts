/** What was dropped: files, and the files in dropped folders, however deep (File and Directory Entries API). */

const isFile = (entry: FileSystemEntry): entry is FileSystemFileEntry => entry.isFile;
const isFolder = (entry: FileSystemEntry): entry is FileSystemDirectoryEntry => entry.isDirectory;

/** Deeper than any export lays its folders; a loop of links ends here. */
const deepest = 12;

/** Must be called while the drop is handled: the browser takes its list away afterwards. */
export function droppedFiles(transfer: DataTransfer): Promise<File[]> {
  const entries = [...transfer.items].map((item) => item.webkitGetAsEntry()).filter((entry) => entry !== null);
  return entries.length > 0 ? filesIn(entries, 0) : Promise.resolve([...transfer.files]);
}

async function filesIn(entries: readonly FileSystemEntry[], depth: number): Promise<File[]> {
  const files: File[] = [];
  for (const entry of entries) {
    if (isFile(entry)) files.push(await new Promise<File>((resolve, reject) => entry.file(resolve, reject)));
    else if (isFolder(entry) && depth < deepest) files.push(...(await filesIn(await entriesOf(entry), depth + 1)));
  }
  return files;
}

/** A folder is read in parts, until a part is empty. */
async function entriesOf(folder: FileSystemDirectoryEntry): Promise<FileSystemEntry[]> {
  const reader = folder.createReader();
  const entries: FileSystemEntry[] = [];
  for (;;) {
    const part = await new Promise<FileSystemEntry[]>((resolve, reject) => reader.readEntries(resolve, reject));
    if (part.length === 0) return entries;
    entries.push(...part);
  }
}

/** Files that systems lay into folders for themselves. */
export const isOfTheSystem = ({ name }: File): boolean => name.startsWith('.') || name === 'Thumbs.db' || name === 'desktop.ini';
