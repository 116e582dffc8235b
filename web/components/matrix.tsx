/**
 * Three rows of printed figures between brackets.
 *
 * @param label said by a screen reader: what the matrix is
 */
export function Matrix({ rows, label }: { rows: readonly (readonly string[])[]; label: string }) {
  return (
    <div className="matrix block max-w-full max-[420px]:px-2 max-[420px]:text-[13px]">
      <table className="w-auto">
        <caption className="sr-only">{label}</caption>
        <tbody>
          {rows.map((row, i) => (
            <tr key={AXES[i]}>
              {row.map((figure, k) => (
                <td
                  key={AXES[k]}
                  className={`whitespace-nowrap border-0 py-px pr-0 text-right ${k > 0 ? 'pl-5 max-sm:pl-2' : ''}`}
                >
                  {figure}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

const AXES = ['x', 'y', 'z'];
