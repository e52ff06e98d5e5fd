import { layOutScene, type PlanScene, type SceneInput } from './plan-scene';

/** Lays out scenes one after the other: the same input gives the same scene, labels keep their places. */
export interface SceneKeeper {
  layOut(input: Omit<SceneInput, 'places'>): PlanScene;
  /** The scene on the screen, for what is under the pointer. */
  current(): PlanScene | null;
}

/** Makes the keeper of one canvas. */
export function createSceneKeeper(): SceneKeeper {
  let last: { input: Omit<SceneInput, 'places'>; scene: PlanScene } | null = null;
  return {
    layOut(input) {
      if (last && sameInput(last.input, input)) return last.scene;
      // a drawing that was moved or zoomed may lay its labels out anew
      const places = last && last.input.view === input.view ? last.scene.places : new Map<string, number>();
      const scene = layOutScene({ ...input, places });
      last = { input, scene };
      return scene;
    },
    current: () => last?.scene ?? null,
  };
}

function sameInput(one: Omit<SceneInput, 'places'>, other: Omit<SceneInput, 'places'>): boolean {
  return (Object.keys(one) as (keyof typeof one)[]).every((key) => one[key] === other[key]);
}
