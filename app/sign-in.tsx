import { SignInScreen } from '@/components/screens/sign-in-screen';

export default function SignIn() {
  return <SignInScreen />;
}
