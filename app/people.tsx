import { PeopleScreen } from '@/components/screens/people-screen';

export default function People() {
  return <PeopleScreen />;
}
