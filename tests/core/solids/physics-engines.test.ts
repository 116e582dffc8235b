// Two general-purpose rigid-body physics engines and a geometry kernel, as second opinions on the solids:
// cannon-es 0.20 (double precision), rapier 0.21 (single precision), manifold-3d 3.5 (robust mesh volumes).
import RAPIER from '@dimforge/rapier3d-compat';
import * as CANNON from 'cannon-es';
import Module from 'manifold-3d';
import { beforeAll, describe, expect, it } from 'vitest';
import { type Body, inertiaAboutCentre } from '#core/inertia/body.ts';
import { eigenSymmetric3 } from '#core/linalg/eigen-symmetric3.ts';
import { recordOfText, rollUpText } from '../../helpers/roll-up-text.ts';

const solid = (text: string, density = 1000): Body =>
  rollUpText(`assembly: s\nparts: [ { name: p, solid: { ${text} }, density: ${density} } ]`).total.basic;

const moments = (body: Body): number[] => [...eigenSymmetric3(inertiaAboutCentre(body)).values];
const sorted = (v: { x: number; y: number; z: number }): number[] => [v.x, v.y, v.z].sort((a, b) => a - b);

const SINGLE = 2e-6;
const expectMoments = (found: readonly number[], expected: readonly number[], share: number) => {
  for (const k of [0, 1, 2]) expect(Math.abs(found[k]! / expected[k]! - 1)).toBeLessThanOrEqual(share);
};

describe('cannon-es', () => {
  const inertia = (shape: CANNON.Shape, mass: number) => {
    const target = new CANNON.Vec3();
    shape.calculateLocalInertia(mass, target);
    return sorted(target);
  };

  it('agrees about a box', () => {
    const box = solid('box: { size: [ 0.31, 0.17, 0.09 ] }');
    const shape = new CANNON.Box(new CANNON.Vec3(0.155, 0.085, 0.045));
    expect(shape.volume() * 1000).toBeCloseTo(box.mass, 12);
    expectMoments(moments(box), inertia(shape, box.mass), 1e-14);
  });

  it('agrees about a sphere', () => {
    const ball = solid('sphere: { diameter: 0.3 }');
    const shape = new CANNON.Sphere(0.15);
    expect(shape.volume() * 1000).toBeCloseTo(ball.mass, 12);
    expectMoments(moments(ball), inertia(shape, ball.mass), 1e-14);
  });
});

describe('rapier', () => {
  beforeAll(async () => {
    await RAPIER.init();
  });

  /** Mass, centre and principal moments of a collider, by a body that carries it. */
  const weigh = (desc: RAPIER.ColliderDesc | null, density = 1000) => {
    const world = new RAPIER.World({ x: 0, y: 0, z: 0 });
    const carrier = world.createRigidBody(RAPIER.RigidBodyDesc.dynamic());
    world.createCollider(desc!.setDensity(density), carrier);
    world.step();
    const centre = carrier.localCom();
    const result = {
      mass: carrier.mass(),
      centre: [centre.x, centre.y, centre.z],
      moments: sorted(carrier.principalInertia()),
    };
    world.free();
    return result;
  };

  it.each([
    ['a box', () => RAPIER.ColliderDesc.cuboid(0.155, 0.085, 0.045), 'box: { size: [ 0.31, 0.17, 0.09 ] }'],
    [
      'a cylinder',
      () => RAPIER.ColliderDesc.cylinder(0.115, 0.07),
      'cylinder: { radius: 0.07, length: 0.23 }',
    ],
    ['a ball', () => RAPIER.ColliderDesc.ball(0.15), 'sphere: { radius: 0.15 }'],
    ['a cone', () => RAPIER.ColliderDesc.cone(0.175, 0.12), 'cone: { radius: 0.12, height: 0.35 }'],
  ] as const)('agrees about %s to single precision', (_, make, text) => {
    const engine = weigh(make());
    const body = solid(text);
    expect(Math.abs(engine.mass / body.mass - 1)).toBeLessThan(SINGLE);
    expectMoments(moments(body), engine.moments, SINGLE);
  });

  /** A scalene tetrahedron and a skew wedge: nothing is symmetric. */
  const points = [0, 0, 0, 0.4, 0.05, 0, 0.1, 0.3, 0.02, 0.05, 0.1, 0.25];

  it('agrees about the convex hull of four points, which is a tetrahedron', () => {
    const engine = weigh(RAPIER.ColliderDesc.convexHull(new Float32Array(points)));
    const body = solid(
      'tetrahedron: { vertices: [ [ 0, 0, 0 ], [ 0.4, 0.05, 0 ], [ 0.1, 0.3, 0.02 ], [ 0.05, 0.1, 0.25 ] ] }',
    );
    expect(Math.abs(engine.mass / body.mass - 1)).toBeLessThan(1e-5);
    for (const k of [0, 1, 2]) expect(engine.centre[k]!).toBeCloseTo(body.centre[k]!, 6);
    expectMoments(moments(body), engine.moments, 1e-4);
  });

  it('agrees about a triangle mesh of a wedge', () => {
    const wedge = [0, 0, 0, 0.3, 0, 0, 0, 0.16, 0, 0, 0, 0.22, 0.3, 0, 0.22, 0, 0.16, 0.22];
    const triangles = [0, 2, 1, 3, 4, 5, 0, 1, 4, 0, 4, 3, 1, 2, 5, 1, 5, 4, 2, 0, 3, 2, 3, 5];
    const engine = weigh(RAPIER.ColliderDesc.trimesh(new Float32Array(wedge), new Uint32Array(triangles)));
    const body = solid('wedge: { size: [ 0.3, 0.16, 0.22 ] }');
    // A mesh without volume in the engine's eyes weighs nothing: then it has no opinion to compare.
    expect(engine.mass).toBeGreaterThan(0);
    expect(Math.abs(engine.mass / body.mass - 1)).toBeLessThan(1e-5);
    expectMoments(moments(body), engine.moments, 1e-4);
  });
});

describe('manifold-3d', () => {
  it('agrees about the volume of what is left of a block after holes, and of its pieces', async () => {
    const kernel = await Module();
    kernel.setup();
    const { Manifold } = kernel;
    const sides = 256;
    const block = Manifold.cube([200, 120, 80], true);
    const hole = Manifold.cylinder(80, 25, 25, sides, true).translate([50, 20, 0]);
    const rest = block.subtract(hole);
    // The kernel's hole is a prism of 256 sides: area ½ n r² sin(2π/n).
    const prism = 0.5 * sides * 25 * 25 * Math.sin((2 * Math.PI) / sides) * 80;
    const record = recordOfText(`
      assembly: block
      units: { length: mm, mass: g }
      parts:
        - name: block
          solid: { box: { size: [ 200, 120, 80 ] } }
          density: 1 g/cm^3
          parts: [ { name: hole, solid: { cylinder: { radius: 25, length: 80 } }, cut: true, at: [ 50, 20, 0 ] } ]
    `);
    const round = Math.PI * 25 * 25 * 80;
    expect(rest.volume() + prism).toBeCloseTo(200 * 120 * 80, 2);
    expect(record.basic.mass * 1e6).toBeCloseTo(rest.volume() + prism - round, 2);
    // Its own mesh, read back as a polyhedron, weighs what the kernel says.
    const mesh = rest.getMesh();
    const vertices = Array.from(
      { length: mesh.numVert },
      (_, i) => `[ ${[0, 1, 2].map((k) => mesh.vertProperties[i * mesh.numProp + k]).join(', ')} ]`,
    );
    const faces = Array.from(
      { length: mesh.numTri },
      (_, i) => `[ ${[...mesh.triVerts.slice(3 * i, 3 * i + 3)].join(', ')} ]`,
    );
    const polyhedron = solid(
      `polyhedron: { vertices: [ ${vertices.join(', ')} ], faces: [ ${faces.join(', ')} ] }`,
      1,
    );
    expect(polyhedron.mass / rest.volume()).toBeCloseTo(1, 6);
    for (const m of [block, hole, rest]) m.delete();
  });
});
