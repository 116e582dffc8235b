import { Button } from '#web/components/button.tsx';
import { DataTable } from '#web/components/data-table.tsx';
import { type ChosenFile, isText } from '#web/lib/chosen-files.ts';
import { formatBytes } from '#web/lib/format-bytes.ts';

/** What will be sent, and which of it is the assembly. */
export function FileTable({
  files,
  top,
  choose,
  remove,
}: {
  files: readonly ChosenFile[];
  top: string | null;
  choose: (path: string) => void;
  remove: (path: string) => void;
}) {
  return (
    <div className="w-full">
      <DataTable
        caption="Chosen files"
        rows={files}
        keyOf={({ path }) => path}
        columns={[
          { key: 'path', head: 'file', cell: ({ path }) => <span className="code">{path}</span> },
          {
            key: 'top',
            head: 'the assembly',
            cell: ({ path }) =>
              isText(path) ? (
                <label className="tick">
                  <input
                    type="radio"
                    name="top"
                    checked={path === top}
                    aria-label={`${path} is the assembly`}
                    onChange={() => choose(path)}
                  />
                  {path === top ? 'this one' : ''}
                </label>
              ) : (
                <span className="soft">–</span>
              ),
          },
          { key: 'size', head: 'size', numeric: true, cell: ({ file }) => formatBytes(file.size) },
          {
            key: 'acts',
            head: '',
            cell: ({ path }) => (
              <Button kind="word" aria-label={`Leave out ${path}`} onClick={() => remove(path)}>
                Leave out
              </Button>
            ),
          },
        ]}
      />
    </div>
  );
}
