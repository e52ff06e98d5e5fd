import { NotFoundScreen } from '@/components/screens/not-found-screen';

export default function NotFound() {
  return <NotFoundScreen />;
}
