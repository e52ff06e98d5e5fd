import { useLocalSearchParams } from 'expo-router';
import { NewPlatformScreen } from '@/components/screens/new-platform-screen';

export default function NewPlatform() {
  const { job } = useLocalSearchParams<{ job: string }>();
  return <NewPlatformScreen jobId={job} />;
}
