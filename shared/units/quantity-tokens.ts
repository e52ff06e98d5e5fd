import { findUnit, type UnitSymbol } from './unit-table';

/** One piece of an entry, with the text it was made from. */
export type QuantityToken = {
  readonly text: string;
  /** No blank stands between this piece and the one before. */
  readonly tight: boolean;
} & (
  | {
      readonly kind: 'number';
      readonly value: number;
      /** Digits alone, as the parts of a fraction are. */
      readonly whole: boolean;
      /** A comma with three digits behind it: a decimal to some, thousands to others. */
      readonly twoReadings: boolean;
    }
  | { readonly kind: 'unit'; readonly unit: UnitSymbol }
  | { readonly kind: 'sign'; readonly sign: '+' | '-' | '*' | '/' | '(' | ')' }
);

/** The pieces of an entry, or the first thing in it that means nothing. */
export type Tokens =
  | { readonly ok: true; readonly tokens: readonly QuantityToken[] }
  | { readonly ok: false; readonly message: string };

const NUMBER = /^(?:\d+(?:[.,]\d*)?|[.,]\d+)(?:[eE][+-]?\d+)?/;
const THOUSANDS = /^[1-9]\d{0,2},\d{3}$/;
const NOISE_UNIT = /^[dD][bB][cC] ?\/ ?[hH][zZ](?!\p{L})/u;
const QUOTES = /^(?:''|′′|’’|["″”'′’°º])/;
const WORD = /^[\p{L}%]+/u;

const SIGNS: Readonly<Record<string, '+' | '-' | '*' | '/' | '(' | ')'>> = {
  '+': '+',
  '-': '-',
  '*': '*',
  '×': '*',
  '·': '*',
  '/': '/',
  '÷': '/',
  '⁄': '/',
  '(': '(',
  ')': ')',
};

const FRACTIONS: Readonly<Record<string, string>> = {
  '½': ' 1/2',
  '¼': ' 1/4',
  '¾': ' 3/4',
  '⅛': ' 1/8',
  '⅜': ' 3/8',
  '⅝': ' 5/8',
  '⅞': ' 7/8',
};

/** Cuts an entry into numbers, units and signs. Blanks, minus signs and fractions are read in every form they have. */
export function quantityTokens(text: string): Tokens {
  let rest = text
    .replace(/[½¼¾⅛⅜⅝⅞]/g, (sign) => FRACTIONS[sign] ?? sign)
    .replace(/[−–‐‑‒]/g, '-')
    .replace(/\s+/g, ' ')
    .trim();
  const tokens: QuantityToken[] = [];
  while (rest !== '') {
    const tight = !rest.startsWith(' ');
    rest = rest.trimStart();
    const token = firstToken(rest, tight, tokens.length === 0);
    if (typeof token === 'string') return { ok: false, message: token };
    tokens.push(token);
    rest = rest.slice(token.text.length);
  }
  return { ok: true, tokens };
}

/** A piece of an entry as a message quotes it. */
export function quoted(text: string): string {
  const most = 16;
  return text.length > most ? `“${text.slice(0, most)}…”` : `“${text}”`;
}

function firstToken(rest: string, tight: boolean, leads: boolean): QuantityToken | string {
  const number = NUMBER.exec(rest)?.[0];
  if (number !== undefined) return numberToken(number, rest.slice(number.length), tight);
  const noise = NOISE_UNIT.exec(rest)?.[0];
  if (noise !== undefined) return { kind: 'unit', unit: 'dBc/Hz', text: noise, tight };
  const unit = QUOTES.exec(rest)?.[0] ?? WORD.exec(rest)?.[0];
  if (unit !== undefined) return unitToken(unit, tight, leads);
  const character = String.fromCodePoint(rest.codePointAt(0) ?? 0);
  const sign = SIGNS[character];
  if (sign !== undefined) return { kind: 'sign', sign, text: character, tight };
  return `${quoted(character)} has no meaning here.`;
}

function numberToken(text: string, after: string, tight: boolean): QuantityToken | string {
  if (/^[.,]/.test(after)) {
    const run = text + (/^[\d.,]+/.exec(after)?.[0] ?? '');
    return `${quoted(run)} is not a number. Leave out what only groups the digits.`;
  }
  const value = Number(text.replace(',', '.'));
  if (!Number.isFinite(value)) return `${quoted(text)} is too large a number.`;
  return {
    kind: 'number',
    value,
    whole: /^\d+$/.test(text),
    twoReadings: THOUSANDS.test(text),
    text,
    tight,
  };
}

function unitToken(text: string, tight: boolean, leads: boolean): QuantityToken | string {
  const unit = findUnit(text);
  if (unit !== null) return { kind: 'unit', unit, text, tight };
  if (/^dbc$/i.test(text)) return 'Noise is given against the carrier in 1 Hz: write dBc/Hz.';
  return `${quoted(text)} is not a ${leads ? 'number' : 'unit known here'}.`;
}
