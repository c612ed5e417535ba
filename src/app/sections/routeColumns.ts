import { isEstimate, type Quantity, scaled } from "../../core/quantity.ts";
import type { StationResult } from "../../core/stationResult.ts";
import { spreadColumn } from "./factColumns.ts";
import type { RouteColumn } from "./StationRoutes.tsx";

const route = (key: string): RouteColumn => ({ key, of: ({ routes }) => routes[key] });

/** A time along the stream: U times it. */
const asLength = (key: string): RouteColumn => ({
  ...route(key),
  shownAs: "L11",
  shown: ({ routes, U }) => {
    const time: Quantity | undefined = routes[key];
    return time !== undefined && isEstimate(U) ? scaled(time, U.value) : time;
  },
});

const field = (
  key: "epsilon" | "epsilon_gradient" | "epsilon_decay" | "epsilon_inertial" | "isotropy_uv" | "isotropy_uw",
): RouteColumn => ({ key, of: (station: StationResult) => station[key] });

/** The integral length by every route, and the transverse scales beside it. */
export const integralColumns: readonly RouteColumn[] = [
  ...["zero-crossing", "one-over-e", "exponential", "low-frequency", "model"].map((of) =>
    asLength(`T_int_${of}`),
  ),
  spreadColumn,
  ...["L_v_ratio", "L_w_ratio"].map(route),
];

/** Large scales, small scales, and where the stress tensor lies. */
export const anisotropyColumns: readonly RouteColumn[] = [
  ...["K_v", "K_w", "rho_uv", "rho_uw", "rho_vw", "anisotropy_xi", "anisotropy_eta"].map(route),
  ...["barycentric_1", "barycentric_2", "barycentric_3"].map(route),
];

export const momentColumns: readonly RouteColumn[] = ["u", "v", "w"].flatMap((of) =>
  [`skewness_${of}`, `flatness_${of}`].map(route),
);

/** The dissipation by every route. */
export const dissipationColumns: readonly RouteColumn[] = [
  ...(["epsilon", "epsilon_gradient", "epsilon_decay", "epsilon_inertial"] as const).map(field),
  ...["epsilon_u-gradient", "epsilon_all-gradients", "epsilon_second-order", "epsilon_third-order"].map(
    route,
  ),
];

/** Mean square gradients: the spectrum's, and differences beside what they should make of that spectrum. */
export const gradientColumns: readonly RouteColumn[] = [
  ...["gradient_u", "gradient_v", "gradient_w"].map(route),
  ...["gradient_difference2", "gradient_difference2_expected"].map(route),
  ...["gradient_difference4", "gradient_difference4_expected"].map(route),
];
