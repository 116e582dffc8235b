import { FilePlace } from './file-place.tsx';
import type { PartNode } from './parts-tree.ts';

/** One line of the tree: a group that opens and closes, or a part with its place in the file. */
export function PartRow({
  node,
  figures,
  open,
  onToggle,
}: {
  node: PartNode;
  figures: readonly string[];
  open: boolean;
  onToggle: () => void;
}) {
  const { part, name, depth, children } = node;
  const notes = part === null ? [] : [part.cut ? 'cut away' : '', part.note ?? ''].filter(Boolean);
  return (
    <tr>
      <th scope="row" style={{ paddingLeft: `${depth * 18}px` }}>
        {children.length > 0 ? (
          <button
            type="button"
            aria-expanded={open}
            onClick={onToggle}
            className="min-h-6 text-left font-semibold"
          >
            <svg viewBox="0 0 10 10" className="mr-2 inline-block size-2.5" aria-hidden="true">
              <path d={open ? 'M1 2.5h8L5 8.5z' : 'M2.5 1v8l6-4z'} className="fill-brass" />
            </svg>
            {name}
            <span className="soft ml-1.5 text-sm font-normal">{leavesOf(node)}</span>
          </button>
        ) : (
          <span className="pl-[18px]">
            {name}
            {notes.length > 0 && <span className="soft ml-1.5 text-sm">{notes.join(' · ')}</span>}
          </span>
        )}
      </th>
      <td className={children.length > 0 ? 'soft' : ''}>{part?.maturity ?? ''}</td>
      {figures.map((figure, i) => (
        // biome-ignore lint/suspicious/noArrayIndexKey: the columns never move
        <td key={i} className="n">
          {figure}
        </td>
      ))}
      <td>{part ? <FilePlace at={part.at} /> : ''}</td>
    </tr>
  );
}

const leavesOf = (node: PartNode): number =>
  node.children.length === 0 ? 1 : node.children.reduce((n, child) => n + leavesOf(child), 0);
