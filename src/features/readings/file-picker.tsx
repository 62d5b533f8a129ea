import { useRef, useState, type DragEvent } from 'react';
import { Button } from '../../ui/button';
import { classNames } from '../../ui/class-names';

interface FilePickerProps {
  fileName: string | null;
  onPick: (file: File) => void;
}

/** Choose a file, or drop it here. */
export function FilePicker({ fileName, onPick }: FilePickerProps) {
  const input = useRef<HTMLInputElement>(null);
  const [isOver, setIsOver] = useState(false);
  const take = (files: FileList | null) => {
    const file = files?.[0];
    if (file) onPick(file);
  };
  const onDrop = (event: DragEvent) => {
    event.preventDefault();
    setIsOver(false);
    take(event.dataTransfer.files);
  };
  return (
    <div
      onDragOver={(event) => {
        event.preventDefault();
        setIsOver(true);
      }}
      onDragLeave={() => setIsOver(false)}
      onDrop={onDrop}
      className={classNames(
        'flex flex-wrap items-center gap-x-4 gap-y-2 rounded border border-dashed px-4 py-4',
        isOver ? 'border-water bg-water-tint' : 'border-edge',
      )}
    >
      <Button onClick={() => input.current?.click()}>
        {fileName === null ? 'Choose a file' : 'Choose another file'}
      </Button>
      <span className={fileName === null ? 'text-muted' : 'figure min-w-0 wrap-anywhere'}>
        {fileName ?? 'or drop it here'}
      </span>
      <input
        ref={input}
        type="file"
        accept=".csv,.tsv,.txt,.dat,text/csv,text/plain,text/tab-separated-values"
        aria-label="File of readings"
        tabIndex={-1}
        className="sr-only"
        onChange={(event) => {
          take(event.target.files);
          // choosing the same file again, after mending it, is a choice as well
          event.target.value = '';
        }}
      />
    </div>
  );
}
