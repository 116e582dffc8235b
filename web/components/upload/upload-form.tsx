import { useState } from 'react';
import type { Uploaded } from '#core/api/push.ts';
import { upload } from '#web/api/upload.ts';
import { Field } from '#web/components/field.tsx';
import { Form } from '#web/components/form.tsx';
import { announce } from '#web/lib/announce.ts';
import { type ChosenFile, guessTop, isText, mergeFiles } from '#web/lib/chosen-files.ts';
import { faultsOf, textOf } from '#web/lib/form-values.ts';
import { DropZone } from './drop-zone.tsx';
import { FileTable } from './file-table.tsx';

const FILES_AT_MOST = 200;
const BYTES_AT_MOST = 64 * 2 ** 20;

/** Choose files, say which is the assembly, send them. */
export function UploadForm({
  project,
  answered,
}: {
  project: string;
  /** Null as soon as something is sent again. */
  answered: (uploaded: Uploaded | null) => void;
}) {
  const [files, setFiles] = useState<readonly ChosenFile[]>([]);
  const [top, setTop] = useState<string | null>(null);
  const keep = async (next: readonly ChosenFile[]) => {
    setFiles(next);
    if (!next.some(({ path }) => path === top)) setTop(await guessTop(next));
  };
  const add = async (come: readonly ChosenFile[]) => {
    await keep(mergeFiles(files, come));
    announce(`${come.length} ${come.length === 1 ? 'file' : 'files'} chosen`);
  };
  return (
    <Form
      act="Roll it up"
      acting="Rolling up…"
      wide
      check={() => faultsOf({ files: filesFault(files, top) })}
      submit={async (values) => {
        answered(null);
        answered(await upload(project, files, top!, textOf(values, 'state')));
      }}
    >
      <DropZone add={add} />
      {files.length > 0 && (
        <>
          <FileTable
            files={files}
            top={top}
            choose={setTop}
            remove={(path) => void keep(files.filter((chosen) => chosen.path !== path))}
          />
          <div className="w-full max-w-[460px]">
            <Field
              name="state"
              label="State"
              why="Left empty, every state of the assembly is rolled up: a run each."
              autoComplete="off"
              spellCheck={false}
            />
          </div>
        </>
      )}
    </Form>
  );
}

function filesFault(files: readonly ChosenFile[], top: string | null): string | undefined {
  if (files.length === 0) return 'Choose the assembly’s files first.';
  if (files.length > FILES_AT_MOST)
    return `These are ${files.length} files; at most ${FILES_AT_MOST} go at once. Leave out what the assembly does not use.`;
  const large = files.find(({ file }) => file.size > BYTES_AT_MOST);
  if (large) return `${large.path} is larger than 64 MiB: push it with the command instead.`;
  if (!files.some(({ path }) => isText(path)))
    return 'None of these is a YAML file: the assembly itself is missing.';
  return top === null ? 'Say which file is the assembly.' : undefined;
}
