import type { Who } from './people.ts';

/** Who has a token of their own. */
export type Pusher = Extract<Who, 'noor' | 'tomas'>;

/** One commit of the demo's history: what was replaced in which file, who wrote it, and how many days ago. */
export interface DemoCommit {
  readonly daysAgo: number;
  readonly by: Who;
  readonly message: string;
  /** The assembly that it is about; its states are pushed. */
  readonly top: string;
  readonly edits: readonly DemoEdit[];
  readonly branch?: string;
  readonly dirty?: boolean;
  /** By their own token instead of the CI's. */
  readonly pushedBy?: Pusher;
  readonly release?: DemoRelease;
  readonly comments?: readonly { readonly by: Who; readonly hours: number; readonly text: string }[];
}

export interface DemoEdit {
  readonly file: string;
  readonly from: string;
  readonly to: string;
}

/** Of every state of the commit, or of one. */
export interface DemoRelease {
  readonly state?: string;
  readonly preparedBy: Who;
  readonly checkedBy?: Who;
  readonly approvedBy?: Who;
  readonly reason?: string;
  readonly withdrawn?: { readonly by: Who; readonly days: number; readonly reason: string };
}

const DRONE = 'survey-drone/drone.yaml';
const SOUNDER = 'spinner/sounder.yaml';
const ARM = 'two-link-arm/arm.yaml';

const edit =
  (file: string) =>
  (from: string, to: string): DemoEdit => ({ file, from, to });
const drone = edit(DRONE);
const sounder = edit(SOUNDER);
const arm = edit(ARM);

/** What was otherwise in the examples when the history begins; the commits lead from there to the files as they are. */
export const BEGINNING: readonly DemoEdit[] = [
  drone('half_span: { value: 900 mm', 'half_span: { value: 780 mm'),
  drone('boom: { value: 700 mm', 'boom: { value: 660 mm'),
  drone('battery_x: { value: 165 mm', 'battery_x: { value: 150 mm'),
  drone('camera: { value: 318 g', 'camera: { value: 292 g'),
  drone('skin: { value: 0.8 mm', 'skin: { value: 1.0 mm'),
  drone(
    'mass: { value: 684 g, tol: 8 g }\n        at: [battery_x, 0, -62]\n        maturity: measured\n        basis: measured',
    'mass: { value: 610 g, tol: 40 g }\n        at: [battery_x, 0, -62]\n        maturity: estimated\n        basis: estimated',
  ),
  drone('mass: 84 g\n', 'mass: 66 g\n'),
  drone('mass: 48 g\n', 'mass: 41 g\n'),
  sounder('rim: { value: 430 mm', 'rim: { value: 410 mm'),
  sounder('arm: 620 mm', 'arm: 640 mm'),
  sounder('trim: { value: 0.33 kg', 'trim: { value: 0.10 kg'),
  sounder('mass: { value: 1.62 kg, tol: 0.01 kg }', 'mass: { value: 1.50 kg, tol: 0.10 kg }'),
  arm('fore: { value: 320 mm', 'fore: { value: 300 mm'),
  arm('wall: { value: 2.5 mm', 'wall: { value: 3.5 mm'),
  arm('load: { value: 2 kg', 'load: { value: 1.5 kg'),
  arm('mass: 0.74 kg', 'mass: 0.68 kg'),
];

export const COMMITS: readonly DemoCommit[] = [
  { daysAgo: 152, by: 'noor', message: 'Roll the drone up from text', top: DRONE, edits: [] },
  {
    daysAgo: 149,
    by: 'noor',
    message: 'Thinner skin after the layup trial',
    top: DRONE,
    edits: [drone('skin: { value: 1.0 mm', 'skin: { value: 0.8 mm')],
  },
  { daysAgo: 146, by: 'tomas', message: 'Roll the sounding payload up from text', top: SOUNDER, edits: [] },
  {
    daysAgo: 141,
    by: 'noor',
    message: 'Battery weighed: the mean of six packs',
    top: DRONE,
    edits: [
      drone(
        'mass: { value: 610 g, tol: 40 g }\n        at: [battery_x, 0, -62]\n        maturity: estimated\n        basis: estimated',
        'mass: { value: 684 g, tol: 8 g }\n        at: [battery_x, 0, -62]\n        maturity: measured\n        basis: measured',
      ),
    ],
    comments: [
      { by: 'tomas', hours: 3, text: 'Does the growth allowance of the pack go to zero with this?' },
      {
        by: 'noor',
        hours: 4,
        text: 'Yes: measured is 0 % in our table. The predicted mass rises by less than the basic one.',
      },
    ],
  },
  {
    daysAgo: 136,
    by: 'tomas',
    message: 'Battery 15 mm forward to bring the centre back to the spar',
    top: DRONE,
    edits: [drone('battery_x: { value: 150 mm', 'battery_x: { value: 165 mm')],
  },
  {
    daysAgo: 133,
    by: 'noor',
    message: 'Speed controller as bought',
    top: DRONE,
    edits: [drone('mass: 41 g\n', 'mass: 48 g\n')],
    release: { preparedBy: 'noor', checkedBy: 'tomas', approvedBy: 'ingrid' },
  },
  {
    daysAgo: 127,
    by: 'tomas',
    message: 'Shorter sensor arms after the flutter note',
    top: SOUNDER,
    edits: [sounder('arm: 640 mm', 'arm: 620 mm')],
  },
  { daysAgo: 121, by: 'noor', message: 'Roll the arm up from text', top: ARM, edits: [] },
  {
    daysAgo: 117,
    by: 'noor',
    message: 'Thinner tubes: 2.5 mm carries the load',
    top: ARM,
    edits: [arm('wall: { value: 3.5 mm', 'wall: { value: 2.5 mm')],
  },
  {
    daysAgo: 112,
    by: 'tomas',
    message: 'Larger base plate for the spin moment',
    top: SOUNDER,
    edits: [sounder('rim: { value: 410 mm', 'rim: { value: 430 mm')],
  },
  {
    daysAgo: 108,
    by: 'noor',
    message: 'Booms 40 mm longer for the new tail',
    top: DRONE,
    edits: [drone('boom: { value: 660 mm', 'boom: { value: 700 mm')],
  },
  {
    daysAgo: 103,
    by: 'noor',
    message: 'Gripper weighed',
    top: ARM,
    edits: [arm('mass: 0.68 kg', 'mass: 0.74 kg')],
    release: {
      preparedBy: 'noor',
      checkedBy: 'tomas',
      approvedBy: 'ingrid',
      withdrawn: {
        by: 'ingrid',
        days: 9,
        reason: 'The load case of 2 kg was agreed after this; it was computed with 1.5 kg.',
      },
    },
    comments: [{ by: 'lucia', hours: 60, text: 'The customer wants the 2 kg load in the acceptance case.' }],
  },
  {
    daysAgo: 97,
    by: 'noor',
    message: 'Longer wings: the survey height asks for them',
    top: DRONE,
    edits: [drone('half_span: { value: 780 mm', 'half_span: { value: 900 mm')],
    comments: [
      {
        by: 'tomas',
        hours: 2,
        text: 'Roll is now heavier than pitch: the two smaller principal axes have changed places. The autopilot gains need both.',
      },
    ],
  },
  {
    daysAgo: 92,
    by: 'tomas',
    message: 'Load of 2 kg as agreed',
    top: ARM,
    edits: [arm('load: { value: 1.5 kg', 'load: { value: 2 kg')],
  },
  {
    daysAgo: 88,
    by: 'tomas',
    message: 'Battery of the payload weighed',
    top: SOUNDER,
    edits: [sounder('mass: { value: 1.50 kg, tol: 0.10 kg }', 'mass: { value: 1.62 kg, tol: 0.01 kg }')],
  },
  {
    daysAgo: 84,
    by: 'tomas',
    message: 'Try the heavy mapping camera',
    top: DRONE,
    edits: [drone('camera: { value: 292 g', 'camera: { value: 412 g')],
    comments: [
      { by: 'noor', hours: 1, text: 'Take-off mass and the payload agreement are both broken by this one.' },
      { by: 'lucia', hours: 5, text: 'Then it cannot be on main. Is there a lighter one?' },
    ],
  },
  {
    daysAgo: 83,
    by: 'noor',
    message: 'The lighter camera of the same maker',
    top: DRONE,
    edits: [drone('camera: { value: 412 g', 'camera: { value: 318 g')],
  },
  {
    daysAgo: 76,
    by: 'tomas',
    message: 'More trim mass: the principal axis leaned',
    top: SOUNDER,
    edits: [sounder('trim: { value: 0.10 kg', 'trim: { value: 0.33 kg')],
    release: { preparedBy: 'tomas', checkedBy: 'noor', approvedBy: 'ingrid' },
  },
  {
    daysAgo: 71,
    by: 'noor',
    message: 'Forearm 20 mm longer',
    top: ARM,
    edits: [arm('fore: { value: 300 mm', 'fore: { value: 320 mm')],
    release: { preparedBy: 'noor', checkedBy: 'tomas', approvedBy: 'ingrid' },
  },
  {
    daysAgo: 64,
    by: 'tomas',
    message: 'Try shorter booms',
    top: DRONE,
    branch: 'short-booms',
    pushedBy: 'tomas',
    edits: [drone('boom: { value: 700 mm', 'boom: { value: 600 mm')],
    comments: [{ by: 'tomas', hours: 1, text: 'The balance leaves its limit forward; not worth it.' }],
  },
  {
    daysAgo: 57,
    by: 'noor',
    message: 'Wiring counted again, with connectors',
    top: DRONE,
    edits: [drone('boom: { value: 600 mm', 'boom: { value: 700 mm'), drone('mass: 66 g\n', 'mass: 84 g\n')],
  },
  {
    daysAgo: 43,
    by: 'noor',
    message: 'Say where the battery tray travels',
    top: DRONE,
    edits: [drone('note: travel of the battery tray', 'note: travel of the battery tray on its rails')],
    release: {
      preparedBy: 'noor',
      checkedBy: 'tomas',
      approvedBy: 'ingrid',
    },
    comments: [
      {
        by: 'ingrid',
        hours: 30,
        text: 'Compared with the first release: wings, booms and camera account for all of it.',
      },
    ],
  },
  {
    daysAgo: 34,
    by: 'tomas',
    message: 'Pack 3 mm off its place, as found in assembly',
    top: SOUNDER,
    edits: [sounder('pack_y: 0 mm', 'pack_y: 3 mm')],
  },
  {
    daysAgo: 31,
    by: 'tomas',
    message: 'Pack back in the middle with a shim',
    top: SOUNDER,
    edits: [sounder('pack_y: 3 mm', 'pack_y: 0 mm')],
  },
  {
    daysAgo: 24,
    by: 'noor',
    message: 'Reach study with a longer forearm',
    top: ARM,
    branch: 'long-reach',
    pushedBy: 'noor',
    dirty: true,
    edits: [arm('fore: { value: 320 mm', 'fore: { value: 380 mm')],
  },
  {
    daysAgo: 17,
    by: 'noor',
    message: 'Forearm stays; a little more wall at the shoulder drive',
    top: ARM,
    edits: [
      arm('fore: { value: 380 mm', 'fore: { value: 320 mm'),
      arm('wall: { value: 2.5 mm', 'wall: { value: 2.6 mm'),
    ],
  },
  {
    daysAgo: 9,
    by: 'tomas',
    message: 'Camera with its new lens hood',
    top: DRONE,
    edits: [drone('camera: { value: 318 g', 'camera: { value: 331 g')],
  },
  {
    daysAgo: 5,
    by: 'noor',
    message: 'Battery tray of thinner plywood',
    top: DRONE,
    edits: [drone('size: [165, 56], thickness: 1.5', 'size: [165, 56], thickness: 1.2')],
    release: { state: 'flight', preparedBy: 'noor', checkedBy: 'tomas' },
  },
  {
    daysAgo: 2,
    by: 'tomas',
    message: 'Trim as mounted',
    top: SOUNDER,
    edits: [sounder('trim: { value: 0.33 kg', 'trim: { value: 0.325 kg')],
  },
  {
    daysAgo: 1,
    by: 'tomas',
    message: 'Receiver moved aft by 20 mm',
    top: DRONE,
    edits: [drone('at: [-60, 0, 0]', 'at: [-80, 0, 0]')],
  },
];
