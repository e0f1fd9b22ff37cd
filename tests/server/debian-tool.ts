/** Programs of Debian that judge what the product writes. A missing one fails the test: it must not pass because nothing was tried. */
import { spawnSync } from 'node:child_process';
import { findProgram } from '../../server/set-up/debian.mjs';

const missing = (what: string, packageName: string): Error =>
  new Error(`${what} is missing, and this test is nothing without it. As root: apt-get install ${packageName} (npm test does it)`);

/** What dciodvfy, the validator of dicom3tools, says of a file, line by line. */
export function dciodvfy(path: string): string[] {
  const program = findProgram('dciodvfy');
  if (program === undefined) throw missing('dciodvfy', 'dicom3tools');
  const { stdout, stderr } = spawnSync(program, [path], { encoding: 'utf8' });
  return `${stdout}\n${stderr}`.split('\n').filter((line) => line.trim() !== '');
}

/** Debian's own Python, which is the one that Debian's numpy is for. */
const python = '/usr/bin/python3';

/** What a line of Python prints as JSON; `numpy` is imported as `np`, and `paths` are `sys.argv[1:]`. */
export function withNumpy(expression: string, ...paths: string[]): unknown {
  const program = `import json, sys\ntry:\n    import numpy as np\nexcept ImportError:\n    sys.exit(3)\nprint(json.dumps(${expression}))`;
  const { status, stdout, stderr, error } = spawnSync(python, ['-c', program, ...paths], { encoding: 'utf8' });
  if (error !== undefined || status === 3) throw missing('numpy', 'python3-numpy');
  if (status !== 0) throw new Error(stderr);
  return JSON.parse(stdout);
}
