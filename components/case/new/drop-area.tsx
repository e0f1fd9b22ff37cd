/** Where files and folders can be dropped, on a wide screen: a stitched frame that turns solid indigo while something is held over it. */
import { useState, type DragEvent, type ReactNode } from 'react';
import { radius, space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { droppedFiles } from '../intake/dropped-files';

interface DropAreaProps {
  onFiles: (files: File[]) => void;
  children: ReactNode;
}

export function DropArea({ onFiles, children }: DropAreaProps) {
  const { colours } = useTheme();
  const [over, setOver] = useState(false);
  const drop = (event: DragEvent): void => {
    event.preventDefault();
    setOver(false);
    void droppedFiles(event.dataTransfer).then((files) => {
      if (files.length > 0) onFiles(files);
    });
  };
  return (
    <div
      onDragOver={(event) => {
        event.preventDefault();
        setOver(true);
      }}
      onDragLeave={() => setOver(false)}
      onDrop={drop}
      style={{
        border: `1px ${over ? 'solid' : 'dashed'} ${over ? colours.indigo : colours.ruleStrong}`,
        borderRadius: radius.control,
        padding: space(4),
        display: 'flex',
        flexDirection: 'column',
        gap: space(3),
      }}
    >
      {children}
    </div>
  );
}
