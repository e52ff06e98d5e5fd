import { useLocalSearchParams } from 'expo-router';
import { PlanScreen } from '@/components/screens/plan-screen';

export default function Layout() {
  const { layout } = useLocalSearchParams<{ layout: string }>();
  return <PlanScreen layoutId={layout} />;
}
