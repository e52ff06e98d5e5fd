import { MailsScreen } from '@/components/screens/mails-screen';

export default function Mails() {
  return <MailsScreen />;
}
