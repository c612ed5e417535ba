/** What the page says while nothing is loaded: what it takes, and what it needs. */
export function EmptyState({
  onFiles,
  onFolder,
  onDemo,
}: {
  onFiles: () => void;
  onFolder: () => void;
  onDemo: () => void;
}) {
  return (
    <div className="row empty">
      <div />
      <div>
        <h1 className="empty-title">Drop the velocity records of one or more cases.</h1>
        <p className="empty-lead">
          Comma, semicolon, tab or blanks between columns, with or without a heading. Columns, units and
          positions are recognised; what is not is asked. A folder is a case.
        </p>
        <div className="empty-actions">
          <button type="button" className="key first" onClick={onFiles}>
            Choose files
          </button>
          <button type="button" className="key" onClick={onFolder}>
            Choose a folder
          </button>
          <button type="button" className="key" onClick={onDemo}>
            Open the demo
          </button>
          <span>a duct with a perforated screen and its simulations, invented</span>
        </div>
        <LayoutList />
      </div>
      <div className="notes empty-notes">
        <h3>Your files stay on this machine</h3>
        <p>They are read here, and the page asks nothing of any other server.</p>
        <h3>What a case needs</h3>
        <p>Four stations for a law with a free origin; a viscosity for what depends on it.</p>
        <h3>With a case sheet</h3>
        <p>
          A sheet in the drop names its files and carries the choices; this page saves one that the batch
          command takes as well.
        </p>
      </div>
    </div>
  );
}

function LayoutList() {
  return (
    <div className="layouts">
      <section>
        <SeriesDrawing />
        <h2>Probe time series</h2>
        <p>
          One file for each station, or one table with an <i className="sym">x</i> column.
        </p>
        <span className="well">t,u,v,w</span>
      </section>
      <section>
        <ProfileDrawing />
        <h2>A profile already reduced</h2>
        <p>Mean speed and stresses, rms values, or one decaying quantity.</p>
        <span className="well">x,U,uu,vv,ww</span>
      </section>
      <section>
        <SheetDrawing />
        <h2>A case sheet with its records</h2>
        <p>Viscosity, reference length, columns, fit: all that was decided, to be read again.</p>
        <span className="well">case.json</span>
      </section>
    </div>
  );
}

const arrow = <path d="M0 66H28M22 62.5L28 66L22 69.5" strokeWidth="0.9" />;

function SeriesDrawing() {
  // a fixed path: drawn once by hand, so that the page looks alike at every visit
  const trace =
    "M62 38l4-7 3 9 4-13 4 16 3-5 4 8 4-12 4 6 3-9 4 13 4 3 4-15 4 7 3 8 4-6 4-4 4 12 3-17 4 9 4 5 4-11 3 15 4-8 4-5 4 10 3-4 4 7 4-14 4 9 3-6 4 9 4-3 4-8 3 11 4-5 4 4 4-7 3 8 4-3 4-5 4 6 3-2 4 4 4-6 4 3";
  return (
    <svg viewBox="0 0 263 76" aria-hidden="true">
      {arrow}
      <circle className="dot" cx="44" cy="38" r="4" />
      <path d={trace} strokeWidth="1.2" strokeLinejoin="round" />
    </svg>
  );
}

/** Points of a law with n = 1.25, drawn with bars that shrink downstream. */
const points = Array.from({ length: 12 }, (_, i) => {
  const x = 52 + i * 18;
  return { x, y: 66 - 150 * (1.6 + i) ** -1.25, bar: 7 / (1 + 0.5 * i) };
});

function ProfileDrawing() {
  return (
    <svg viewBox="0 0 263 76" aria-hidden="true">
      {arrow}
      {points.map(({ x, y, bar }) => (
        <g key={x}>
          <path d={`M${x} ${y - bar}V${y + bar}`} strokeWidth="1.1" />
          <circle className="dot" cx={x} cy={y} r="3" />
        </g>
      ))}
    </svg>
  );
}

function SheetDrawing() {
  return (
    <svg viewBox="0 0 263 76" aria-hidden="true">
      {arrow}
      <path d="M52 8H88L98 18V66H52ZM88 8V18H98M60 28H90M60 36H84M60 44H90M60 52H76" strokeWidth="1.1" />
      {[0, 1, 2, 3, 4].map((i) => (
        <path key={i} d={`M${122 + i * 26} ${24 + i * 2.6}V${52 - i * 2.6}`} strokeWidth="3.2" />
      ))}
      <path d="M106 22C150 30 190 33 250 34M106 54C150 46 190 43 250 42" strokeWidth="0.9" />
    </svg>
  );
}
