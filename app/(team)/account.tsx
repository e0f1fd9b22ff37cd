import { AccountScreen } from '@/components/team/account-screen';

export default function AccountRoute() {
  return <AccountScreen />;
}
