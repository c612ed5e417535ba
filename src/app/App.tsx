import { useCallback, useMemo, useRef } from "react";
import { useStore } from "zustand";
import { axisActions } from "./page/axisActions.ts";
import { DropVeil } from "./page/DropVeil.tsx";
import { FilePicker, type Picker } from "./page/FilePicker.tsx";
import { FigureSettings } from "./page/figureSettings.ts";
import { Head } from "./page/Head.tsx";
import { headActions } from "./page/headActions.ts";
import { Notice } from "./page/Notice.tsx";
import { PageRuler } from "./page/PageRuler.tsx";
import { PlacedCases } from "./page/placedCases.ts";
import { RestedCases } from "./page/restedCases.ts";
import { sectionList } from "./page/sectionList.ts";
import { createStillCases } from "./page/stillCases.ts";
import { useCaseViews } from "./page/useCaseViews.ts";
import { useHeadHeight } from "./page/useHeadHeight.ts";
import { useScreenFigures } from "./page/useScreenFigures.ts";
import { useMediaQuery, useTheme } from "./page/useTheme.ts";
import { useUndoKeys } from "./page/useUndoKeys.ts";
import { DefinitionContext, DefinitionDoor, type OpenDefinition } from "./sections/definitionContext.ts";
import { PageBody } from "./sections/PageBody.tsx";
import { heldOf } from "./session/nextSession.ts";
import { openDemo } from "./session/openDemo.ts";
import type { DroppedFile } from "./session/openDrop.ts";
import type { PageStore } from "./session/pageStore.ts";
import type { PageWork } from "./session/pageWork.ts";

/** The page: head with the ruler, then the argument, or what stands in its place while there is none. */
export function App({ store, work }: { store: PageStore; work: PageWork }) {
  const { session, notice, dispatch, setNotice } = useStore(store);
  const [mode, toggleMode] = useTheme();
  const narrow = useMediaQuery("screen and (max-width: 959px)");
  const { live, rested } = useCaseViews(store);
  const still = useMemo(createStillCases, []);
  const held = heldOf(session);
  const axis = held?.history.present.axis ?? "x";
  const settings = useScreenFigures(held, mode, narrow);
  const head = useRef<HTMLElement>(null);
  const picker = useRef<Picker>(null);
  useHeadHeight(head);
  useUndoKeys(dispatch);
  const drop = useDrop(work, setNotice);
  // the panel of definitions comes with the argument; the readings of the head open it through this door
  const door = useRef<OpenDefinition>(null);
  const openDefinition: OpenDefinition = useCallback((asked, beside) => door.current?.(asked, beside), []);
  const there = live.length > 0;
  const sections = useMemo(() => sectionList.map((section) => ({ ...section, there })), [there]);
  const demo = () => {
    drop(openDemo());
    setNotice("The demo is on its way: 24 MB of records from beside this page.");
  };
  return (
    <FigureSettings value={settings}>
      <RestedCases value={still(rested)}>
        <PlacedCases value={rested}>
          <a className="skip" href="#top">
            To the page
          </a>
          <Head
            ref={head}
            sections={sections}
            actions={headActions({ held, mode, picker, dispatch, toggleMode })}
            lanes={live.length}
            more={axisActions(live, axis, dispatch)}
          >
            <DefinitionContext value={openDefinition}>
              <PageRuler store={store} cases={live} work={work} />
            </DefinitionContext>
          </Head>
          <main id="top" tabIndex={-1}>
            {notice !== null && <Notice text={notice} onClose={() => setNotice(null)} />}
            <DefinitionDoor value={door}>
              <PageBody
                store={store}
                work={work}
                cases={live}
                narrow={narrow}
                picker={picker}
                onDemo={demo}
              />
            </DefinitionDoor>
          </main>
          <FilePicker ref={picker} onChoice={(files) => drop(Promise.resolve(files))} />
          <DropVeil more={there} onDrop={drop} />
        </PlacedCases>
      </RestedCases>
    </FigureSettings>
  );
}

/** Hands files to the work; what goes wrong on the way is said at the top of the page. */
function useDrop(work: PageWork, setNotice: (text: string | null) => void) {
  return useCallback(
    (files: Promise<DroppedFile[]>) => {
      setNotice(null);
      work
        .drop(files)
        .catch((error: unknown) => setNotice(error instanceof Error ? error.message : String(error)));
    },
    [work, setNotice],
  );
}
