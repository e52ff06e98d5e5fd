import { useLocalSearchParams } from 'expo-router';
import { RevisionScreen } from '@/components/screens/revision-screen';

export default function Revision() {
  const { revision } = useLocalSearchParams<{ revision: string }>();
  return <RevisionScreen revisionId={revision} />;
}
