import { useLocalSearchParams } from 'expo-router';
import { JobScreen } from '@/components/screens/job-screen';

export default function Job() {
  const { job } = useLocalSearchParams<{ job: string }>();
  return <JobScreen jobId={job} />;
}
