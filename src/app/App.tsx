import { useCallback, useMemo, useRef } from "react";
import { useStore } from "zustand";
import { defaultFigureOptions } from "../figures/figureSpec.ts";
import { darkTokens, lightTokens } from "../figures/tokens.ts";
import { DropVeil } from "./page/DropVeil.tsx";
import { FilePicker, type Picker } from "./page/FilePicker.tsx";
import { FigureSettings, screenScale } from "./page/figureSettings.ts";
import { Head } from "./page/Head.tsx";
import { headActions } from "./page/headActions.ts";
import { PageRuler } from "./page/PageRuler.tsx";
import { RestedCases } from "./page/restedCases.ts";
import { sectionList } from "./page/sectionList.ts";
import { useHeadHeight } from "./page/useHeadHeight.ts";
import { useMediaQuery, useTheme } from "./page/useTheme.ts";
import { useUndoKeys } from "./page/useUndoKeys.ts";
import { useWindowWidth } from "./page/useWindowWidth.ts";
import { Argument } from "./sections/Argument.tsx";
import { EmptyState } from "./sections/EmptyState.tsx";
import { FailedState } from "./sections/FailedState.tsx";
import { LookingState } from "./sections/ReadingState.tsx";
import { createCaseViews } from "./session/caseViews.ts";
import { heldOf } from "./session/nextSession.ts";
import { openDemo } from "./session/openDemo.ts";
import type { DroppedFile } from "./session/openDrop.ts";
import type { PageStore } from "./session/pageStore.ts";
import type { PageWork } from "./session/pageWork.ts";

/** The page: head with the ruler, then the argument, or what stands in its place while there is none. */
export function App({ store, work }: { store: PageStore; work: PageWork }) {
  const { session, drafts, notice, dispatch, setNotice } = useStore(store);
  const [mode, toggleMode] = useTheme();
  const narrow = useMediaQuery("(max-width: 959px)");
  const width = useWindowWidth();
  const liveViews = useMemo(createCaseViews, []);
  const restedViews = useMemo(createCaseViews, []);
  const rested = restedViews(session, noDrafts);
  const live = drafts.length === 0 ? rested : liveViews(session, drafts);
  const held = heldOf(session);
  const head = useRef<HTMLElement>(null);
  const picker = useRef<Picker>(null);
  useHeadHeight(head);
  useUndoKeys(dispatch);

  const drop = useCallback(
    (files: Promise<DroppedFile[]>) => {
      setNotice(null);
      work
        .drop(files)
        .catch((error: unknown) => setNotice(error instanceof Error ? error.message : String(error)));
    },
    [work, setNotice],
  );
  const demo = () => {
    drop(openDemo());
    setNotice("The demo is on its way: 24 MB of records from beside this page.");
  };
  const settings = useMemo(
    () => ({
      ...defaultFigureOptions,
      ...screenScale(width, narrow),
      tokens: mode === "dark" ? darkTokens : lightTokens,
      axis: held?.history.present.axis ?? "x",
      units: held?.history.present.cases[0]?.sheet.units ?? "SI",
      along: held?.history.present.cases[0]?.sheet.along ?? "x",
      tolerance: held?.history.present.cases[0]?.sheet.compare.tolerance ?? 0.1,
    }),
    [width, narrow, mode, held?.history.present],
  );
  const actions = headActions({ held, mode, picker, dispatch, toggleMode });
  const there = live.length > 0;
  return (
    <FigureSettings value={settings}>
      <RestedCases value={rested}>
        <a className="skip" href="#top">
          To the page
        </a>
        <Head ref={head} sections={sectionList.map((section) => ({ ...section, there }))} actions={actions}>
          <PageRuler store={store} cases={live} work={work} />
        </Head>
        <main id="top" tabIndex={-1}>
          {notice !== null && (
            <p className="notice row" role="alert">
              <span />
              <span>
                {notice}{" "}
                <button type="button" className="action" onClick={() => setNotice(null)}>
                  Close
                </button>
              </span>
            </p>
          )}
          {session.kind === "reading" && (
            <div className="row page-top">
              <div />
              <div>
                <LookingState offer={session.offer} />
              </div>
            </div>
          )}
          {session.kind === "failed" && <FailedState aside={session.aside} />}
          {(session.kind === "empty" || session.kind === "failed") && (
            <EmptyState
              onFiles={() => picker.current?.files()}
              onFolder={() => picker.current?.folder()}
              onDemo={demo}
            />
          )}
          {held !== null && live.length > 0 && (
            <Argument store={store} work={work} held={held} cases={live} narrow={narrow} />
          )}
        </main>
        <FilePicker ref={picker} onChoice={(files) => drop(Promise.resolve(files))} />
        <DropVeil more={there} onDrop={drop} />
      </RestedCases>
    </FigureSettings>
  );
}

const noDrafts = [] as const;
