import { useLocalSearchParams } from 'expo-router';
import { InvitationScreen } from '@/components/screens/invitation-screen';

export default function Invitation() {
  const { token } = useLocalSearchParams<{ token: string }>();
  return <InvitationScreen token={token} />;
}
