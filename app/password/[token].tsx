import { useLocalSearchParams } from 'expo-router';
import { NewPasswordScreen } from '@/components/screens/new-password-screen';

export default function NewPassword() {
  const { token } = useLocalSearchParams<{ token: string }>();
  return <NewPasswordScreen token={token} />;
}
