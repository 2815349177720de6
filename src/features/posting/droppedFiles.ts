/** Everything that was dropped, also the files inside dropped folders. */
export async function droppedFiles(transfer: DataTransfer): Promise<File[]> {
  // Entries have to be taken before the first await: the browser empties the list when the event is over.
  const entries = [...transfer.items].map((item) => item.webkitGetAsEntry?.()).filter((entry) => entry != null);
  if (entries.length === 0) return [...transfer.files];
  return (await Promise.all(entries.map(filesIn))).flat();
}

async function filesIn(entry: FileSystemEntry): Promise<File[]> {
  if (entry.isFile) {
    const file = await new Promise<File>((resolve, reject) => (entry as FileSystemFileEntry).file(resolve, reject));
    return [file];
  }
  const reader = (entry as FileSystemDirectoryEntry).createReader();
  const found: File[] = [];
  // A reader answers in portions and ends with an empty one.
  for (;;) {
    const some = await new Promise<FileSystemEntry[]>((resolve, reject) => reader.readEntries(resolve, reject));
    if (some.length === 0) return found;
    for (const inner of some) if (inner.isFile) found.push(...(await filesIn(inner)));
  }
}
