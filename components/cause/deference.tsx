/** Said once wherever advice is given. */
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';

export function Deference() {
  return (
    <Text variant="detail" tone="inkSoft" style={{ paddingTop: space(3) }}>
      The advice here defers to local protocol and licensed practice. Heat, a spark, a worn cable, anything loose near the magnet: stop, and
      call the MR safety officer.
    </Text>
  );
}
