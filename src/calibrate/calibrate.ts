import { auditClaim } from "../audit/audit.js";
import { createPool } from "../audit/pool.js";
import type { Calibration } from "../result/calibration.js";
import { makeCase } from "./case.js";
import { draw } from "./draw.js";
import { randomFrom } from "./random.js";
import { type Scored, score, summarise } from "./score.js";

export interface CalibrateOptions {
  readonly seed: number;
  readonly claims: number;
  /** Threads; 0 works in the calling one. */
  readonly workers: number;
  readonly signal?: AbortSignal;
  /** The part done, 0 to 1. */
  readonly onProgress?: (part: number) => void;
}

/** Draws that come to nothing, one after the other, before the seed is given up. */
const MOST_DRAWS = 100;
/** Claims under way at once for each worker, so that none waits for the main thread. */
const AT_ONCE = 2;

/** Draws claims from a seed, audits them and adds up how the audits did. Each claim depends on seed and number alone. */
export async function calibrate(options: CalibrateOptions): Promise<Calibration> {
  const { seed, claims, workers, signal, onProgress } = options;
  const began = performance.now();
  const pool = await createPool(workers);
  const scored = new Array<Scored>(claims);
  let next = 0;
  let done = 0;
  onProgress?.(0);
  const work = async (): Promise<void> => {
    for (let i = next++; i < claims; i = next++) {
      signal?.throwIfAborted();
      scored[i] = await one(seed, i, signal);
      done++;
      onProgress?.(done / claims);
    }
  };
  const one = async (from: number, number: number, stop?: AbortSignal): Promise<Scored> => {
    const random = randomFrom(Math.imul(from, 0x9e3779b1) ^ Math.imul(number + 1, 0x85ebca6b));
    const name = `claim ${number} of seed ${from}`;
    for (let attempt = 0; attempt < MOST_DRAWS; attempt++) {
      const made = await makeCase(draw(random), random, pool, name);
      if (made === null) continue;
      const { withoutReference } = made.draw;
      const asked = stop === undefined ? { withoutReference } : { withoutReference, signal: stop };
      const result = await auditClaim(made.claim, pool, asked);
      return score(name, made, result);
    }
    throw new Error(`no claim can be made of seed ${from}, number ${number}`);
  };
  try {
    await Promise.all(Array.from({ length: Math.max(1, AT_ONCE * workers) }, work));
  } finally {
    await pool.close();
  }
  return summarise(seed, scored, (performance.now() - began) / 1000);
}
