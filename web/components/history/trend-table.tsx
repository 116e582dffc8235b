import { Link } from 'react-router-dom';
import type { Trend } from '#core/api/runs.ts';
import { Time } from '#web/components/time.tsx';
import { VerdictMark } from '#web/components/verdict-mark.tsx';
import { linkTo } from '#web/paths.ts';
import { layOutTrend } from './trend-layout.ts';

/** What the picture of a trend shows, newest first. */
export function TrendTable({ trend, project, title }: { trend: Trend; project: string; title: string }) {
  const at = layOutTrend(trend, 1000, 250);
  const limits = at.stops.map((s) => `${s.name} ${s.text}`).concat(at.off);
  return (
    // biome-ignore lint/a11y/noNoninteractiveTabindex: what scrolls must be reachable by keyboard
    <section aria-label={`${title} as a table`} tabIndex={0} className="max-h-80 max-w-3xl overflow-y-auto">
      <table>
        <caption>
          {title}, {trend.assembly}, {trend.state}
          {limits.length > 0 ? `; limits: ${limits.join('; ')} ${at.head}` : ''}
        </caption>
        <thead>
          <tr>
            <th scope="col">run</th>
            <th scope="col">when</th>
            <th scope="col" className="n">
              value <i>{at.head}</i>
            </th>
            <th scope="col">verdict</th>
            <th scope="col">release</th>
          </tr>
        </thead>
        <tbody>
          {at.points.toReversed().map(({ point, text }) => (
            <tr key={point.run}>
              <th scope="row">
                <Link to={linkTo.run(project, point.run)} className="code">
                  {point.label}
                </Link>
              </th>
              <td>
                <Time at={point.at} />
              </td>
              <td className="n">{text}</td>
              <td>
                <VerdictMark verdict={point.verdict} />
              </td>
              <td>{point.released ? 'released' : ''}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  );
}
