import { type ChangeEvent, type DragEvent, useId, useRef, useState } from 'react';
import { Button } from '#web/components/button.tsx';
import { useFieldFault } from '#web/components/form.tsx';
import type { ChosenFile } from '#web/lib/chosen-files.ts';
import { filesOfChooser, filesOfDrop } from '#web/lib/files-of-drop.ts';

/** Where files are dropped, with choosers for files and for a whole folder beside it. */
export function DropZone({ add }: { add: (files: readonly ChosenFile[]) => Promise<unknown> }) {
  const [over, setOver] = useState(false);
  const files = useRef<HTMLInputElement>(null);
  const folder = useRef<HTMLInputElement>(null);
  const fault = useFieldFault('files');
  const id = useId();
  const drop = (event: DragEvent) => {
    event.preventDefault();
    setOver(false);
    void filesOfDrop(event.dataTransfer.items).then(add);
  };
  const chosen = (event: ChangeEvent<HTMLInputElement>) => {
    const list = filesOfChooser(event.target.files!);
    event.target.value = '';
    void add(list);
  };
  return (
    // biome-ignore lint/a11y/noStaticElementInteractions: dropping is a second way; the buttons are the first.
    <div
      className="drop"
      data-over={over ? '' : undefined}
      onDragOver={(event) => {
        event.preventDefault();
        setOver(true);
      }}
      onDragLeave={() => setOver(false)}
      onDrop={drop}
    >
      <p>
        Drop files or a folder here, or{' '}
        <Button
          kind="word"
          data-invalid={fault === undefined ? undefined : ''}
          aria-describedby={fault === undefined ? undefined : id}
          onClick={() => files.current?.click()}
        >
          choose files
        </Button>{' '}
        or{' '}
        <Button kind="word" onClick={() => folder.current?.click()}>
          a whole folder
        </Button>
        .
      </p>
      <p className="soft">YAML, STL, OBJ and what else the assembly names. What is hidden is left out.</p>
      {fault !== undefined && (
        <p className="outside" id={id}>
          {fault}
        </p>
      )}
      <input ref={files} type="file" multiple hidden onChange={chosen} aria-label="Files of the assembly" />
      <input
        ref={folder}
        type="file"
        multiple
        hidden
        onChange={chosen}
        aria-label="Folder of the assembly"
        {...{ webkitdirectory: '' }}
      />
    </div>
  );
}
