/** A button that opens the browser's own picker, of files or of a folder with all that is in it. */
import { useRef } from 'react';
import { Button, type ButtonKind } from '@/components/ui/button';

interface FileButtonProps {
  label: string;
  kind?: ButtonKind;
  grow?: boolean;
  tall?: boolean;
  busy?: boolean | number;
  folder?: boolean;
  onFiles: (files: File[]) => void;
}

/** Every browser knows it under this name (File and Directory Entries API); React's types do not. */
const pickFolder = { webkitdirectory: '' };

export function FileButton({ label, kind = 'quiet', grow = false, tall = false, busy = false, folder = false, onFiles }: FileButtonProps) {
  const input = useRef<HTMLInputElement>(null);
  return (
    <>
      <input
        ref={input}
        type="file"
        multiple
        {...(folder ? pickFolder : {})}
        hidden
        aria-label={label}
        onChange={(event) => {
          const files = [...(event.currentTarget.files ?? [])];
          // The same file may be chosen again after it was refused.
          event.currentTarget.value = '';
          if (files.length > 0) onFiles(files);
        }}
      />
      <Button label={label} kind={kind} grow={grow} tall={tall} busy={busy} onPress={() => input.current?.click()} />
    </>
  );
}
