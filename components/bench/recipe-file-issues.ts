/** What is wrong with a recipe file, each line with the place in the file: steps are counted from 1, as people do. */
import type { Issue } from '@/server/contract/problem';

export function issueLines(issues: readonly Issue[]): string[] {
  return issues.map(({ path, message }) => {
    const place = (path[0] === 'file' ? path.slice(1) : path).map((part) => (typeof part === 'number' ? String(part + 1) : part));
    return place.length > 0 ? `${place.join(' › ')}: ${message}` : message;
  });
}
