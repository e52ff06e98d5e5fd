import { FirstVisitScreen } from '@/components/screens/first-visit-screen';

export default function FirstVisit() {
  return <FirstVisitScreen />;
}
