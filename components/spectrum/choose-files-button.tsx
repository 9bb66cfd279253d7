'use client';

import { useRef } from 'react';

import { Button } from '@/components/ui/button';

/** Opens the browser's own file chooser, many files at once. */
export function ChooseFilesButton({
  onFiles,
  label = 'Upload spectra',
}: {
  onFiles: (files: File[]) => void;
  label?: string;
}) {
  const input = useRef<HTMLInputElement>(null);
  return (
    <>
      <Button variant="primary" onClick={() => input.current?.click()}>
        {label}
      </Button>
      <input
        ref={input}
        type="file"
        multiple
        hidden
        aria-label="Spectrum files"
        onChange={(event) => {
          onFiles([...(event.currentTarget.files ?? [])]);
          event.currentTarget.value = ''; // so that the same file can be chosen again
        }}
      />
    </>
  );
}
