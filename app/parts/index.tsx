import { PartsScreen } from '@/components/screens/parts-screen';

export default function Parts() {
  return <PartsScreen />;
}
