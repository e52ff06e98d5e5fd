import { useFonts } from 'expo-font';
import { useEffect } from 'react';
import { font, fontSources } from './fonts';
import { line, space } from './tokens';
import type { Theme } from './themes';
import { useTheme } from './use-theme';

const STYLE_ID = 'elbowroom-document';

/** Brings the theme to what lies outside the components: page, focus rings, selection, printing, fonts. */
export function ThemeDocument() {
  const theme = useTheme();
  // Text stands at once in the fallback face and changes when ours is there.
  useFonts(fontSources);
  useEffect(() => {
    let style = document.getElementById(STYLE_ID);
    if (!style) {
      style = document.createElement('style');
      style.id = STYLE_ID;
      document.head.append(style);
    }
    style.textContent = documentRules(theme);
    let meta = document.querySelector<HTMLMetaElement>('meta[name="theme-color"]');
    if (!meta) {
      meta = document.createElement('meta');
      meta.name = 'theme-color';
      document.head.append(meta);
    }
    meta.content = theme.color.sheet;
  }, [theme]);
  return null;
}

function documentRules({ name, color }: Theme): string {
  return `
:root { color-scheme: ${name}; accent-color: ${color.action}; }
html, body { background: ${color.ground}; color: ${color.ink}; font-family: ${font.text.regular}; -webkit-text-size-adjust: 100%; }
::selection { background: ${color.action}; color: ${color.onAction}; }
::placeholder { color: ${color.inkSoft}; opacity: 1; }
:focus { outline: none; }
:focus-visible { outline: ${line.bold}px solid ${color.focus}; outline-offset: ${line.bold}px; }
input:focus-visible, textarea:focus-visible, select:focus-visible { outline-offset: ${line.none}px; }
select option { background: ${color.sheet}; color: ${color.ink}; }
@media (prefers-reduced-motion: reduce) { *, *::before, *::after { animation: none !important; transition: none !important; scroll-behavior: auto !important; } }
@media (forced-colors: active) { :focus-visible { outline-color: Highlight; } }
@media print {
  @page { margin: ${space.xxl}px; }
  html, body, #root { height: auto !important; overflow: visible !important; background: none; }
  [data-noprint] { display: none !important; }
}
`;
}
