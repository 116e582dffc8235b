import { describe, expect, it } from 'vitest';
import { guessTop, mergeFiles } from '#web/lib/chosen-files.ts';

const chosen = (path: string, text = '') => ({ path, file: new File([text], path.split('/').at(-1)!) });
const paths = (files: readonly { path: string }[]) => files.map(({ path }) => path);

describe('files chosen for an upload', () => {
  it('leave out the one folder that holds them all', () => {
    const files = mergeFiles([], [chosen('heron/heron.yaml'), chosen('heron/meshes/mount.stl')]);
    expect(paths(files)).toEqual(['heron.yaml', 'meshes/mount.stl']);
  });

  it('keep their folders where no one folder holds them all', () => {
    const files = mergeFiles([], [chosen('heron.yaml'), chosen('meshes/mount.stl')]);
    expect(paths(files)).toEqual(['heron.yaml', 'meshes/mount.stl']);
  });

  it('take the place of those of the same path that were there', async () => {
    const files = mergeFiles([chosen('heron.yaml', 'old')], [chosen('heron.yaml', 'new')]);
    expect(files).toHaveLength(1);
    expect(await files[0]!.file.text()).toBe('new');
  });

  it('are topped by the YAML file that no other includes', async () => {
    const top = await guessTop([
      chosen('a-tail.yaml', 'assembly: tail'),
      chosen('heron.yaml', 'parts:\n  - name: tail\n    include: a-tail.yaml'),
      chosen('mount.stl', 'include: heron.yaml'),
    ]);
    expect(top).toBe('heron.yaml');
  });

  it('prefer the file highest up where several could be the top', async () => {
    expect(await guessTop([chosen('old/a.yaml'), chosen('heron.yml')])).toBe('heron.yml');
  });

  it('have no top where none is YAML', async () => {
    expect(await guessTop([chosen('mount.stl')])).toBeNull();
  });
});
