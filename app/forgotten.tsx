import { ForgottenScreen } from '@/components/screens/forgotten-screen';

export default function Forgotten() {
  return <ForgottenScreen />;
}
