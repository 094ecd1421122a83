import type { MethodDefinition } from "../methods/definition.js";
import type { CompiledSystem } from "./system.js";

/** Whether a method can step a system, and why not. */
export function appliesTo(
  method: MethodDefinition,
  system: CompiledSystem,
): { readonly ok: true } | { readonly ok: false; readonly reason: string } {
  if (method.family !== "splitting" || !system.velocityDependent) return { ok: true };
  return {
    ok: false,
    reason:
      `${method.name} splits the motion into kicks and drifts, which asks for accelerations that do not ` +
      `depend on the velocity; those of ${system.definition.name} do`,
  };
}
