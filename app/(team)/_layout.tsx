import { Slot } from 'expo-router';
import { TeamFrame } from '@/components/team/team-frame';

export default function TeamLayout() {
  return (
    <TeamFrame>
      <Slot />
    </TeamFrame>
  );
}
