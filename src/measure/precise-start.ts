import { fromDouble } from "../arithmetic/double-double.js";
import type { PreparedScenario } from "./run.js";

/** A start whose doubles are all that is known of it. */
export const startOfDoubles = ({
  state,
  parameters,
  nullParameters,
}: Pick<PreparedScenario, "state" | "parameters" | "nullParameters">): PreparedScenario["precise"] => ({
  state: state.map(fromDouble),
  parameters: parameters.map(fromDouble),
  nullParameters: nullParameters?.map(fromDouble) ?? null,
});
