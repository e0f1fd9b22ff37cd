/** A new case: the three steps, and after saving the number it got. */
import { useSession } from '@/components/api/session';
import { NewCaseScreen } from './new-case-screen';
import { SavedScreen } from './saved-screen';

interface NewCaseProps {
  /** Id of the case that was just filed. */
  saved: string | undefined;
  scannerId: string | undefined;
}

export function NewCase({ saved, scannerId }: NewCaseProps) {
  const session = useSession();
  if (saved) return <SavedScreen caseId={saved} />;
  if (!session.data) return null;
  return <NewCaseScreen memberId={session.data.member.id} scannerId={scannerId ?? null} />;
}
