import type { Check } from "../../result/result.js";
import type { Evidence } from "../evidence.js";
import { check, NO_SOLUTION, notChecked } from "./common.js";

/** Nearer to the formal order than to any other whole one. */
const TOLERANCE = 0.5;

/** The state converges at the order that the method promises. */
export function order({ solution, ladders }: Evidence): Check {
  if (solution === null) return notChecked("order", NO_SOLUTION);
  const { stateOrder } = ladders[0]!;
  const { method, formalOrder } = solution;
  if (stateOrder === null) {
    return notChecked(
      "order",
      `The state of ${method} shows no order: too few rungs stand clear of rounding.`,
    );
  }
  const off = Math.abs(stateOrder - formalOrder);
  const measured = `The state converges at order ${stateOrder.toFixed(2)}; ${method} promises ${formalOrder}.`;
  return check("order", off <= TOLERANCE ? "pass" : "fail", measured, off, TOLERANCE, "orders");
}
