import type { Scene } from './optics/scene.ts';

/** One demo picture: what it is called, how large it is, and what stands before the camera. */
export interface Picture {
  fileName: string;
  width: number;
  height: number;
  /** Rays per picture point: more where much is out of focus. */
  rays: number;
  scene: () => Promise<Scene> | Scene;
}

/** A picture across, 1600 by 1200, or upright as from a phone. */
export const picture = (
  fileName: string,
  scene: Picture['scene'],
  options: { upright?: boolean; rays?: number } = {},
): Picture => ({
  fileName,
  width: options.upright ? 1200 : 1600,
  height: options.upright ? 1600 : 1200,
  rays: options.rays ?? 6,
  scene,
});
