import { Barlow_400Regular } from '@expo-google-fonts/barlow/400Regular';
import { Barlow_500Medium } from '@expo-google-fonts/barlow/500Medium';
import { Barlow_600SemiBold } from '@expo-google-fonts/barlow/600SemiBold';
import { BarlowSemiCondensed_400Regular } from '@expo-google-fonts/barlow-semi-condensed/400Regular';
import { BarlowSemiCondensed_500Medium } from '@expo-google-fonts/barlow-semi-condensed/500Medium';
import { BarlowSemiCondensed_600SemiBold } from '@expo-google-fonts/barlow-semi-condensed/600SemiBold';

/** The faces that are shipped, by the names that they are loaded under (licence: assets/fonts/README.md). */
export const fontSources = {
  'Barlow Regular': Barlow_400Regular,
  'Barlow Medium': Barlow_500Medium,
  'Barlow SemiBold': Barlow_600SemiBold,
  'Barlow Semi Condensed Regular': BarlowSemiCondensed_400Regular,
  'Barlow Semi Condensed Medium': BarlowSemiCondensed_500Medium,
  'Barlow Semi Condensed SemiBold': BarlowSemiCondensed_600SemiBold,
} as const;

const FALLBACK = 'system-ui, sans-serif';

/** `text` for sentences; `figures` (semi condensed, used with tabular figures) for tables and the plan. */
export const font = {
  text: {
    regular: `"Barlow Regular", ${FALLBACK}`,
    medium: `"Barlow Medium", ${FALLBACK}`,
    strong: `"Barlow SemiBold", ${FALLBACK}`,
  },
  figures: {
    regular: `"Barlow Semi Condensed Regular", ${FALLBACK}`,
    medium: `"Barlow Semi Condensed Medium", ${FALLBACK}`,
    strong: `"Barlow Semi Condensed SemiBold", ${FALLBACK}`,
  },
} as const;
