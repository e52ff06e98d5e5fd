import { solveSceneSchema } from '@/shared/api/solve-scene';
import type { Scene } from '@/shared/em/scene';
import { sceneProblems, type SceneProblem } from '@/shared/em/scene-problems';

/** Either scenes (and whether they came as an array) or every problem with its path. */
export type ParsedScenes =
  | { readonly ok: true; readonly scenes: Scene[]; readonly many: boolean }
  | { readonly ok: false; readonly problems: SceneProblem[] };

/** Reads one scene or an array of scenes from JSON text, strictly. */
export function parseScenes(text: string): ParsedScenes {
  const json = parseJson(text);
  if (!json.ok) return { ok: false, problems: [{ path: 'input', message: json.message }] };
  const many = Array.isArray(json.value);
  const inputs: unknown[] = Array.isArray(json.value) ? json.value : [json.value];
  const scenes: Scene[] = [];
  const problems: SceneProblem[] = [];
  inputs.forEach((input, i) => {
    const prefix = many ? [i] : [];
    const parsed = solveSceneSchema.safeParse(input);
    if (parsed.success) {
      scenes.push(parsed.data);
      problems.push(
        ...sceneProblems(parsed.data).map((p) => ({
          ...p,
          path: `${pathOf(prefix)}${many ? '.' : ''}${p.path}`,
        })),
      );
      return;
    }
    for (const issue of parsed.error.issues) {
      const keys = issue.code === 'unrecognized_keys' ? issue.keys : [null];
      for (const key of keys) {
        const path = [...prefix, ...issue.path, ...(key === null ? [] : [key])];
        problems.push({
          path: pathOf(path) || 'input',
          message: key === null ? issue.message : 'unknown key',
        });
      }
    }
  });
  return problems.length > 0 ? { ok: false, problems } : { ok: true, scenes, many };
}

function parseJson(text: string): { ok: true; value: unknown } | { ok: false; message: string } {
  if (text.trim() === '')
    return { ok: false, message: 'is empty: a scene as JSON is expected on standard input' };
  try {
    return { ok: true, value: JSON.parse(text) };
  } catch (error) {
    // Deep nesting ends in a RangeError, all else in a SyntaxError.
    const reason = error instanceof SyntaxError ? error.message.split('\n')[0] : 'nested too deep';
    return { ok: false, message: `is not JSON: ${reason}` };
  }
}

/** `[1].wires[2].load.re`; a key that could break the line is quoted. */
function pathOf(path: readonly PropertyKey[]): string {
  return path
    .map((part, i) => {
      if (typeof part === 'number') return `[${part}]`;
      const name = String(part);
      const plain = /^[\w-]{1,80}$/.test(name) ? name : JSON.stringify(name.slice(0, 80));
      return i === 0 ? plain : `.${plain}`;
    })
    .join('');
}
