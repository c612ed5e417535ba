import { StrictMode } from "react";
import { createRoot } from "react-dom/client";
import { createBrowserEngine } from "../engine/browserEngine.ts";
import { App } from "./App.tsx";
import { keepPage } from "./keeping/keepPage.ts";
import { keepOffline } from "./offline/keepOffline.ts";
import { createPageStore } from "./session/pageStore.ts";
import { startPageWork } from "./session/pageWork.ts";
import "./styles/fonts.css";
import "./styles/tokens.css";
import "./styles/base.css";
import "./styles/head.css";
import "./styles/section.css";
import "./styles/parts.css";
import "./styles/table.css";
import "./styles/controls.css";
import "./styles/reduction.css";
import "./styles/body.css";
import "./styles/compare.css";
import "./styles/argument.css";
import "./styles/methods.css";
import "./styles/states.css";
import "./styles/narrow.css";
import "./styles/print.css";

const store = createPageStore();
const work = startPageWork(store, createBrowserEngine());
const root = document.getElementById("root");
const show = () => {
  if (root)
    createRoot(root).render(
      <StrictMode>
        <App store={store} work={work} />
      </StrictMode>,
    );
};
// a page that comes back at once is not shown empty first
const patience = new Promise((resolve) => setTimeout(resolve, 250));
void Promise.race([keepPage(store), patience]).finally(show);
keepOffline();
