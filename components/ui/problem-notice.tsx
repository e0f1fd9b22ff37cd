/** A fetch that failed, at the place where its content would stand, with the way to try again. */
import { View } from 'react-native';
import { LinkText } from './link-text';
import { Notice } from './notice';
import { space } from './theme';

interface ProblemNoticeProps {
  error: Error;
  onRetry?: () => void;
}

export function ProblemNotice({ error, onRetry }: ProblemNoticeProps) {
  return (
    <View style={{ padding: space(4) }}>
      <Notice kind="failed" text={error.message} action={onRetry ? <LinkText label="again" onPress={onRetry} /> : null} />
    </View>
  );
}
