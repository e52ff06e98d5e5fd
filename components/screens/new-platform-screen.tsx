import { useRouter } from 'expo-router';
import { useState } from 'react';
import { Pressable, View } from 'react-native';
import { describeError, fieldProblems } from '@/components/api/api-problem';
import { useAddPlatform, useJob } from '@/components/api/use-jobs';
import { PlatformPreview } from '@/components/canvas/platform-preview';
import { lengthEntry } from '@/components/panels/quantity-entries';
import { within } from '@/components/panels/read-quantity';
import { usePreferences } from '@/components/theme/preferences';
import { line, space } from '@/components/theme/tokens';
import { useTheme } from '@/components/theme/use-theme';
import { Button, type WebPressState } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Link } from '@/components/ui/link';
import { Notice } from '@/components/ui/notice';
import { QuantityField } from '@/components/ui/quantity-field';
import { Heading, Text } from '@/components/ui/text';
import { nameField } from '@/shared/api/fields';
import {
  buildPlatformDocument,
  initialDimensions,
  STARTER_PLATFORMS,
  type Dimensions,
  type StarterPlatform,
} from '@/shared/layout/starter-platforms';
import { ScreenFrame } from './screen-frame';

/** Makes a platform from a starter outline: choose, type its sizes, name it. */
export function NewPlatformScreen({ jobId }: { readonly jobId: string }) {
  const job = useJob(jobId);
  const router = useRouter();
  const add = useAddPlatform(jobId);
  const [starter, setStarter] = useState<StarterPlatform>(STARTER_PLATFORMS[0]!);
  const [dimensions, setDimensions] = useState<Dimensions>(() => initialDimensions(starter));
  const [typedName, setTypedName] = useState<string | null>(null);
  const [nameProblem, setNameProblem] = useState<string | undefined>();
  const name = typedName ?? starter.name;
  const built = buildPlatformDocument(starter.id, dimensions);
  const refused = fieldProblems(add.error);

  const create = async () => {
    const parsed = nameField.safeParse(name);
    if (!parsed.success) {
      setNameProblem(`The name ${parsed.error.issues[0]?.message ?? 'does not suit'}.`);
      return;
    }
    const platform = await add.mutateAsync({ name, starter: starter.id, dimensions: { ...dimensions } });
    const layout = platform.layouts[0];
    router.replace(layout ? `/layouts/${layout.id}` : `/jobs/${jobId}`);
  };

  return (
    <ScreenFrame
      title="New platform"
      lead="Choose the outline that comes nearest; its sizes are typed below, the rest on the plan."
      above={<Link href={`/jobs/${jobId}`} label={job.data?.name ?? 'The job'} />}
    >
      <View
        role="radiogroup"
        aria-label="Outline"
        style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.m }}
      >
        {STARTER_PLATFORMS.map((one) => (
          <StarterChoice
            key={one.id}
            starter={one}
            chosen={one === starter}
            onChoose={() => {
              setStarter(one);
              setDimensions(initialDimensions(one));
            }}
          />
        ))}
      </View>
      <View style={{ gap: space.l }}>
        <Heading level={2}>{starter.name}</Heading>
        <Text tone="soft">{starter.summary}</Text>
        <Field
          label="Name"
          value={name}
          onChange={(text) => {
            setTypedName(text);
            setNameProblem(undefined);
          }}
          error={nameProblem}
          required
        />
        <DimensionFields
          key={starter.id}
          starter={starter}
          dimensions={dimensions}
          onChange={setDimensions}
        />
        {built.ok ? (
          <Text variant="small" tone="soft">
            {`Datum: ${built.value.platform.datum}. x points ${built.value.platform.forwardAxis}.`}
          </Text>
        ) : (
          <Notice kind="error" text={built.refusal.message} />
        )}
        {add.isError ? <Notice kind="error" text={describeError(add.error)} /> : null}
        {refused.map(({ path, message }) => (
          <Text key={path} variant="small" tone="lacking">{`${path.replace(/^body\./, '')} ${message}`}</Text>
        ))}
        <View style={{ flexDirection: 'row' }}>
          <Button
            label="Create the platform"
            variant="primary"
            onPress={() => void create().catch(shownByMutation)}
            busy={add.isPending}
            disabled={!built.ok}
          />
        </View>
      </View>
    </ScreenFrame>
  );
}

/** What the server refused is shown from the mutation's own state. */
function shownByMutation(error: unknown): void {
  if (!(error instanceof Error)) throw error;
}

type DimensionFieldsProps = {
  readonly starter: StarterPlatform;
  readonly dimensions: Dimensions;
  readonly onChange: (dimensions: Dimensions) => void;
};

function DimensionFields({ starter, dimensions, onChange }: DimensionFieldsProps) {
  const entry = lengthEntry(usePreferences().lengthUnit);
  return (
    <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.l }}>
      {starter.dimensions.map(({ key, label, least, most }) => (
        <View key={key} style={{ flexGrow: 1, flexBasis: 200 }}>
          <QuantityField
            label={label}
            value={dimensions[key] ?? null}
            read={(text) =>
              within(
                entry.read(text),
                least,
                most,
                `Between ${entry.format(least)} and ${entry.format(most)}.`,
              )
            }
            format={entry.format}
            onCommit={(value) => onChange({ ...dimensions, [key]: value })}
            testID={`dimension-${key}`}
          />
        </View>
      ))}
    </View>
  );
}

type StarterChoiceProps = {
  readonly starter: StarterPlatform;
  readonly chosen: boolean;
  readonly onChoose: () => void;
};

function StarterChoice({ starter, chosen, onChoose }: StarterChoiceProps) {
  const { color } = useTheme();
  const built = buildPlatformDocument(starter.id);
  return (
    <Pressable
      role="radio"
      aria-checked={chosen}
      aria-label={starter.name}
      onPress={onChoose}
      style={({ pressed, hovered }: WebPressState) => ({
        width: 156,
        alignItems: 'center',
        gap: space.s,
        padding: space.s,
        borderWidth: chosen ? line.bold : line.hair,
        borderColor: chosen ? color.action : color.rule,
        backgroundColor: pressed || hovered === true ? color.hover : 'transparent',
      })}
    >
      {built.ok ? <PlatformPreview document={built.value} /> : null}
      <Text variant={chosen ? 'smallStrong' : 'small'} align="center">
        {starter.name}
      </Text>
    </Pressable>
  );
}
