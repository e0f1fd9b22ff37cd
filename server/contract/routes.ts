/** Every route there is. The server refuses to start when one of these is not served; tests walk it for roles. */
import * as caseParts from './case-parts';
import * as cases from './cases';
import * as catalogue from './catalogue';
import * as exports from './exports';
import * as health from './health';
import * as images from './images';
import * as measurements from './measurements';
import * as push from './push';
import * as recipeFile from './recipe-file';
import * as registry from './registry';
import * as series from './series';
import type { Route } from './route';
import * as session from './session';
import * as simulations from './simulations';

const isRoute = (value: unknown): value is Route => typeof value === 'object' && value !== null && 'method' in value && 'access' in value;

export const routes: readonly Route[] = [
  session,
  health,
  images,
  measurements,
  catalogue,
  series,
  simulations,
  exports,
  recipeFile,
  registry,
  push,
  cases,
  caseParts,
].flatMap((resource) => Object.values(resource).filter(isRoute));
