'use client';

import { useEffect, useState } from 'react';

const carriesFiles = (event: DragEvent) => event.dataTransfer?.types.includes('Files') ?? false;

/** Files and, apart from them, the names of folders: a browser hands a folder over as a file that cannot be read. */
function droppedOn(event: DragEvent): { files: File[]; folders: string[] } {
  const files: File[] = [];
  const folders: string[] = [];
  for (const item of event.dataTransfer?.items ?? []) {
    const entry = item.kind === 'file' ? item.webkitGetAsEntry() : null;
    const file = item.getAsFile();
    if (entry?.isDirectory) folders.push(entry.name);
    else if (file) files.push(file);
  }
  return { files, folders };
}

/** Takes files dropped anywhere on the page; true while some are held over it. */
export function useFileDrop(onDrop: ((files: File[], folders: string[]) => void) | null): boolean {
  const [over, setOver] = useState(false);
  useEffect(() => {
    if (!onDrop) return;
    let depth = 0;
    const enter = (event: DragEvent) => {
      if (!carriesFiles(event)) return;
      depth += 1;
      setOver(true);
    };
    const hold = (event: DragEvent) => {
      if (carriesFiles(event)) event.preventDefault(); // else the browser opens the file instead of handing it over
    };
    const leave = (event: DragEvent) => {
      if (!carriesFiles(event)) return;
      depth = Math.max(0, depth - 1);
      if (depth === 0) setOver(false);
    };
    const drop = (event: DragEvent) => {
      if (!carriesFiles(event)) return;
      event.preventDefault();
      depth = 0;
      setOver(false);
      const { files, folders } = droppedOn(event);
      onDrop(files, folders);
    };
    const listeners = { dragenter: enter, dragover: hold, dragleave: leave, drop };
    for (const [name, listener] of Object.entries(listeners))
      window.addEventListener(name as 'drop', listener);
    return () => {
      for (const [name, listener] of Object.entries(listeners))
        window.removeEventListener(name as 'drop', listener);
    };
  }, [onDrop]);
  return over;
}
