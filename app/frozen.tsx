import { FrozenScreen } from '@/components/screens/frozen-screen';

export default function Frozen() {
  return <FrozenScreen />;
}
