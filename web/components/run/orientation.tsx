import { formatFixed } from '#core/figures/index.ts';
import type { RollUpRecord } from '#core/record/record.ts';
import { Matrix } from '#web/components/matrix.tsx';
import { SectionHead } from '#web/components/section-head.tsx';
import type { RunView } from './run-view.ts';

const DECIMALS = 6;

/** Where the principal axes point: as a rotation matrix with its direction said, and as a quaternion. */
export function OrientationSection({ record, view }: { record: RollUpRecord; view: RunView }) {
  const { principal } = record[view.on];
  if (!principal) return null;
  const names = principal.nearest.map((name) => `near ${name}`).join(', ');
  return (
    <section aria-labelledby="orientation">
      <SectionHead title="Orientation of the principal axes" id="orientation">
        right-handed
      </SectionHead>
      <div className="flex flex-wrap items-start gap-x-10 gap-y-4">
        <div>
          <Matrix
            rows={principal.axes.map((row) => row.map((c) => formatFixed(c, DECIMALS)))}
            label={`Rotation matrix; rows are the principal axes ${names}, in body axes`}
          />
          <p className="soft mt-1.5 max-w-[44ch] text-sm">
            Rows are the principal axes ({names}) in body axes: the matrix takes a vector from body axes to
            principal axes.
          </p>
        </div>
        <div>
          <p className="font-figures text-[15px] leading-relaxed">
            [{principal.quaternion.map((c) => formatFixed(c, DECIMALS)).join(', ')}]
          </p>
          <p className="soft mt-1.5 max-w-[44ch] text-sm">
            Unit quaternion [w, x, y, z] of the rotation that turns the body axes into the principal axes; w
            is not negative.
          </p>
        </div>
      </div>
    </section>
  );
}
