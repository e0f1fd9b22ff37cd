/** A button that opens the browser's own file picker. */
import { useRef } from 'react';
import { Button, type ButtonKind } from '@/components/ui/button';

interface FileButtonProps {
  label: string;
  kind?: ButtonKind;
  grow?: boolean;
  tall?: boolean;
  busy?: boolean | number;
  onFiles: (files: File[]) => void;
}

export function FileButton({ label, kind = 'quiet', grow = false, tall = false, busy = false, onFiles }: FileButtonProps) {
  const input = useRef<HTMLInputElement>(null);
  return (
    <>
      <input
        ref={input}
        type="file"
        multiple
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
