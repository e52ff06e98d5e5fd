import { AccountScreen } from '@/components/screens/account-screen';

export default function Account() {
  return <AccountScreen />;
}
