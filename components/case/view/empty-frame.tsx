/** The place of a picture on the mat while its facts are fetched: a stitched frame of its size, still. */
import { View } from 'react-native';
import { Text } from '@/components/ui/text';
import { useTheme } from '@/components/ui/theme-context';

export function EmptyFrame({ size }: { size: number }) {
  const { colours } = useTheme();
  return (
    <View
      role="status"
      aria-busy
      style={{
        width: size,
        height: size + 74,
        paddingBottom: 74,
      }}
    >
      <View
        style={{
          flex: 1,
          alignItems: 'center',
          justifyContent: 'center',
          borderWidth: 1,
          borderStyle: 'dashed',
          borderColor: colours.matInkSoft,
        }}
      >
        <Text variant="small" tone="matInkSoft">
          fetching
        </Text>
      </View>
    </View>
  );
}
