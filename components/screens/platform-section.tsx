import { useState } from 'react';
import { View } from 'react-native';
import { useAddLayout, useRenameLayout, useRenamePlatform } from '@/components/api/use-jobs';
import { line, space } from '@/components/theme/tokens';
import { useTheme } from '@/components/theme/use-theme';
import { Icon } from '@/components/ui/icon';
import { LinkArea } from '@/components/ui/link';
import { Menu } from '@/components/ui/menu';
import { Chip } from '@/components/ui/state-mark';
import { Heading, Text } from '@/components/ui/text';
import type { JobDetail } from '@/shared/api/jobs';
import { NameDialog } from './name-dialog';

type Platform = JobDetail['platforms'][number];
type Layout = Platform['layouts'][number];
type Revision = Layout['revisions'][number];

const KINDS = { vehicle: 'Vehicle', rooftop: 'Rooftop', handset: 'Handset' } as const;

/** What is being named. */
type Naming =
  | { readonly kind: 'platform' }
  | { readonly kind: 'layout'; readonly layout: Layout }
  | { readonly kind: 'new-layout'; readonly copyOf: Layout | null };

type PlatformSectionProps = { readonly platform: Platform; readonly canEdit: boolean };

/** A platform with its layouts; each layout with its revisions. */
export function PlatformSection({ platform, canEdit }: PlatformSectionProps) {
  const { color } = useTheme();
  const [naming, setNaming] = useState<Naming | null>(null);
  return (
    <View style={{ borderTopWidth: line.bold, borderColor: color.ink }}>
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: space.s, paddingVertical: space.xs }}>
        <Heading level={2}>{platform.name}</Heading>
        <Chip text={KINDS[platform.kind]} />
        <View style={{ flex: 1 }} />
        {canEdit ? (
          <Menu
            label={`More about ${platform.name}`}
            items={[
              { label: 'Rename the platform', icon: 'edit', onPress: () => setNaming({ kind: 'platform' }) },
              {
                label: 'New layout',
                icon: 'add',
                onPress: () => setNaming({ kind: 'new-layout', copyOf: null }),
              },
            ]}
          />
        ) : null}
      </View>
      <View role="list">
        {platform.layouts.map((layout) => (
          <LayoutLine
            key={layout.id}
            layout={layout}
            canEdit={canEdit}
            onRename={() => setNaming({ kind: 'layout', layout })}
            onCopy={() => setNaming({ kind: 'new-layout', copyOf: layout })}
          />
        ))}
      </View>
      {naming ? <Namer naming={naming} platform={platform} onClose={() => setNaming(null)} /> : null}
    </View>
  );
}

type LayoutLineProps = {
  readonly layout: Layout;
  readonly canEdit: boolean;
  readonly onRename: () => void;
  readonly onCopy: () => void;
};

function LayoutLine({
  layout: { id, name, updatedAt, revisions },
  canEdit,
  onRename,
  onCopy,
}: LayoutLineProps) {
  const { color } = useTheme();
  return (
    <View
      role="listitem"
      style={{ borderTopWidth: line.hair, borderColor: color.rule, paddingVertical: space.xs }}
    >
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: space.s }}>
        <LinkArea href={`/layouts/${id}`} label={`Open ${name}`} style={{ flex: 1 }}>
          <View
            style={{ flexDirection: 'row', alignItems: 'center', gap: space.m, paddingVertical: space.s }}
          >
            <View style={{ flex: 1 }}>
              <Text variant="strong">{name}</Text>
              <Text variant="small" tone="soft">
                {`working copy, changed ${new Date(updatedAt).toLocaleString()}`}
              </Text>
            </View>
            <Icon name="chevron-right" tone="inkSoft" />
          </View>
        </LinkArea>
        {canEdit ? (
          <Menu
            label={`More about ${name}`}
            items={[
              { label: 'Rename the layout', icon: 'edit', onPress: onRename },
              { label: 'Copy the layout', icon: 'copy', onPress: onCopy },
            ]}
          />
        ) : null}
      </View>
      {revisions.length > 0 ? (
        <View role="list" style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.s }}>
          {revisions.map((revision) => (
            <RevisionLink key={revision.id} revision={revision} />
          ))}
        </View>
      ) : null}
    </View>
  );
}

function RevisionLink({ revision: { id, letter, state } }: { readonly revision: Revision }) {
  const { color } = useTheme();
  return (
    <View role="listitem" style={{ borderWidth: line.hair, borderColor: color.edge }}>
      <LinkArea href={`/r/${id}`} label={`Revision ${letter}, ${state}`}>
        <View style={{ flexDirection: 'row', gap: space.s, paddingHorizontal: space.m }}>
          <Text variant="figuresStrong">{letter}</Text>
          <Text variant="figures" tone="soft">
            {state}
          </Text>
        </View>
      </LinkArea>
    </View>
  );
}

type NamerProps = {
  readonly naming: Naming;
  readonly platform: Platform;
  readonly onClose: () => void;
};

function Namer({ naming, platform, onClose }: NamerProps) {
  const renamePlatform = useRenamePlatform(platform.id);
  const renameLayout = useRenameLayout(naming.kind === 'layout' ? naming.layout.id : '');
  const addLayout = useAddLayout(platform.id);
  switch (naming.kind) {
    case 'platform':
      return (
        <NameDialog
          title="Rename the platform"
          confirmLabel="Save"
          initial={platform.name}
          sender={renamePlatform}
          onClose={onClose}
        />
      );
    case 'layout':
      return (
        <NameDialog
          title="Rename the layout"
          confirmLabel="Save"
          initial={naming.layout.name}
          sender={renameLayout}
          onClose={onClose}
        />
      );
    case 'new-layout': {
      const { copyOf } = naming;
      return (
        <NameDialog
          title={copyOf ? `Copy of ${copyOf.name}` : 'New layout'}
          confirmLabel={copyOf ? 'Copy' : 'Create the layout'}
          initial={`Layout ${platform.layouts.length + 1}`}
          sender={{
            isPending: addLayout.isPending,
            mutateAsync: ({ name }) => addLayout.mutateAsync({ name, copyOf: copyOf?.id ?? null }),
          }}
          onClose={onClose}
        />
      );
    }
  }
}
