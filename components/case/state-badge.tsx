/** The state of a case, as a cloth that is being woven, with its word. */
import { Badge } from '@/components/ui/badge';
import type { CaseState } from '@/server/contract/cases';
import { stateWords } from './words';

export function StateBadge({ state, small = false }: { state: CaseState; small?: boolean }) {
  return <Badge glyph={state} word={stateWords[state]} small={small} />;
}
