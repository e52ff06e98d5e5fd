import { JobsScreen } from '@/components/screens/jobs-screen';

export default function Jobs() {
  return <JobsScreen />;
}
