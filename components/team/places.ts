/** The places of the team's part, in the order of the rail and of the five words at the foot of a phone. */
import type { Href } from 'expo-router';

export interface Place {
  readonly word: string;
  readonly href: Href;
  /** Beginning of the paths that belong to it. */
  readonly path: string;
}

export const places: readonly Place[] = [
  { word: 'cases', href: '/cases', path: '/cases' },
  { word: 'causes', href: '/causes', path: '/causes' },
  { word: 'scanners', href: '/scanners', path: '/scanners' },
];

export const account: Place = { word: 'account', href: '/account', path: '/account' };

export const isAt = (place: Place, pathname: string): boolean => pathname === place.path || pathname.startsWith(`${place.path}/`);

/** The foot with the five words stands under places, not under a case, a form or the bench: those have actions of their own. */
export const hasFoot = (pathname: string): boolean => [...places, account].some((place) => pathname === place.path);

/** Where to go after signing in: a path of our own, never another site. */
export const safePath = (path: string | undefined): string => (path !== undefined && /^\/(?![/\\])/.test(path) ? path : '/cases');
