/** The title of the browser's tab. */
import { useEffect } from 'react';

export function usePageTitle(title: string): void {
  useEffect(() => {
    document.title = title === 'Pickglass' ? title : `${title} · Pickglass`;
  }, [title]);
}
