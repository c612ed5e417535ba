import { balanceFigure } from "../../figures/balanceFigure.ts";
import { isotropyFigure } from "../../figures/isotropyFigure.ts";
import { scalesFigure } from "../../figures/scalesFigure.ts";
import { figureName } from "../page/figureNumbers.ts";
import type { SectionFigure } from "./ArgumentSection.tsx";
import { RouteTable } from "./RouteTable.tsx";
import type { Note } from "./SectionFrame.tsx";

/** The figures that need nothing but the cases, with their captions. */
export const isotropyPicture: SectionFigure = {
  name: figureName("isotropy"),
  title: "Ratios of the rms velocities along the stream",
  widthMm: 178,
  build: isotropyFigure,
  caption: (
    <>
      Ratios of the rms velocities; one in isotropic turbulence. Filled: inside the fit window. Bars: 95 %.
      Shaded: tolerance.
    </>
  ),
};

export const scalesPicture: SectionFigure = {
  name: figureName("scales"),
  title: "Length scales and Taylor Reynolds number along the stream",
  widthMm: 178,
  build: scalesFigure,
  caption: (
    <>
      (<i>a</i>) Integral, Taylor and Kolmogorov lengths; bars smaller than a marker are not drawn. (<i>b</i>)
      Taylor Reynolds number. Lines, where the axis starts at the origin, have the slopes that <i>n</i> and a
      constant <i>C</i>
      <sub className="sym">ε</sub> imply; only their height is fitted. Pennant: in doubt, see the flags.
    </>
  ),
};

export const balancePicture: SectionFigure = {
  name: figureName("balance"),
  title: "Dissipation of the decay over that of the gradients",
  widthMm: 86,
  build: balanceFigure,
  beside: (cases) => <RouteTable cases={cases} />,
  caption: (
    <>Dissipation that the decay asks for over the one that gradients carry. Bars: 95 %. Shaded: tolerance.</>
  ),
};

export const isotropyNotes: readonly Note[] = [
  {
    name: "Isotropy",
    body: (
      <p>
        Ratios of one component to another say nothing of the small scales: those are judged by the balance of
        the dissipation.
      </p>
    ),
  },
];

export const balanceNotes: readonly Note[] = [
  {
    name: "How to read it",
    body: (
      <p>
        One within its interval where gradients are resolved and the flow is homogeneous and stationary. Above
        one: gradients are lost, to the grid, the filter or the sampling. Below one: noise, or a flow still
        developing.
      </p>
    ),
  },
];
