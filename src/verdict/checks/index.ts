import type { Check } from "../../result/result.js";
import type { Evidence } from "../evidence.js";
import { agrees } from "./agrees.js";
import { carriesDigits } from "./carries-digits.js";
import { notChecked } from "./common.js";
import { conserves } from "./conserves.js";
import { converges } from "./converges.js";
import { nullRun } from "./null.js";
import { order } from "./order.js";
import { reproduces } from "./reproduces.js";
import { standsClear } from "./stands-clear.js";

/** Every check, in the order in which they are listed. */
export function allChecks(evidence: Evidence): Check[] {
  return [
    reproduces(evidence),
    converges(evidence),
    order(evidence),
    conserves(evidence),
    nullRun(evidence),
    agrees(evidence),
    standsClear(evidence),
    carriesDigits(evidence),
    notChecked("sampling", "No stored data to look at: the audit ran the scenario itself."),
  ];
}
