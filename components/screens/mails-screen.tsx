import { Fragment, useState } from 'react';
import { View } from 'react-native';
import type { Href } from 'expo-router';
import { describeError } from '@/components/api/api-problem';
import { useSession } from '@/components/api/session-provider';
import { useMails } from '@/components/api/use-people';
import { line, space } from '@/components/theme/tokens';
import { useTheme } from '@/components/theme/use-theme';
import { Button } from '@/components/ui/button';
import { Link } from '@/components/ui/link';
import { EmptyState, ErrorState, LoadingState } from '@/components/ui/states';
import { Text } from '@/components/ui/text';
import type { Mail } from '@/shared/api/session';
import { NotFoundScreen } from './not-found-screen';
import { placeWithin } from './places';
import { ScreenFrame } from './screen-frame';

/** The mails that the demo's server sent: caught here instead of leaving the machine. */
export function MailsScreen() {
  const { abilities } = useSession();
  return abilities.seeMails ? <Mails /> : <NotFoundScreen />;
}

function Mails() {
  const mails = useMails();
  const [open, setOpen] = useState<string | null>(null);
  return (
    <ScreenFrame
      title="Mails"
      lead="While the demo is on, no mail leaves this machine: what would have been sent is shown here."
    >
      {mails.isPending ? (
        <LoadingState label="Fetching the mails" />
      ) : mails.isError ? (
        <ErrorState
          title="The mails did not arrive"
          text={describeError(mails.error)}
          onRetry={() => void mails.refetch()}
        />
      ) : mails.data.items.length === 0 ? (
        <EmptyState
          icon="mail"
          title="No mail yet"
          text="Invite somebody, or comment on an antenna, and the mail about it appears here."
        />
      ) : (
        <View role="list">
          {mails.data.items.map((mail) => (
            <MailLine
              key={mail.id}
              mail={mail}
              open={open === mail.id}
              onToggle={() => setOpen(open === mail.id ? null : mail.id)}
            />
          ))}
        </View>
      )}
    </ScreenFrame>
  );
}

type MailLineProps = { readonly mail: Mail; readonly open: boolean; readonly onToggle: () => void };

function MailLine({ mail: { to, subject, text, receivedAt }, open, onToggle }: MailLineProps) {
  const { color } = useTheme();
  return (
    <View
      role="listitem"
      style={{
        gap: space.s,
        paddingVertical: space.m,
        borderBottomWidth: line.hair,
        borderColor: color.rule,
      }}
    >
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: space.m }}>
        <View style={{ flex: 1 }}>
          <Text variant="strong">{subject}</Text>
          <Text variant="small" tone="soft">{`To ${to}, ${new Date(receivedAt).toLocaleString()}`}</Text>
        </View>
        <Button label={`${open ? 'Close' : 'Read'} “${subject}”`} expanded={open} onPress={onToggle}>
          {open ? 'Close' : 'Read'}
        </Button>
      </View>
      {open ? <MailText text={text} /> : null}
    </View>
  );
}

/** The text of a mail; addresses of this server are links that stay in this window. */
function MailText({ text }: { readonly text: string }) {
  const pieces = text.split(/(https?:\/\/\S+)/);
  return (
    <Text selectable>
      {pieces.map((piece, index) => {
        const path = /^https?:/.test(piece) ? placeWithin(piece) : null;
        return (
          <Fragment key={index}>
            {path === null ? piece : <Link href={path as Href} label={piece} />}
          </Fragment>
        );
      })}
    </Text>
  );
}
