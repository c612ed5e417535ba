/** Heights of the six strokes: they wane as the turbulence does. */
const strokes = [17, 13, 10, 7.4, 5.2, 3.6];

export function WordMark() {
  return (
    <a className="mark" href="#top">
      <svg width="28" height="18" viewBox="0 0 28 18" aria-hidden="true">
        {strokes.map((height, i) => (
          <rect
            key={height}
            x={i * 5}
            y={9 - height / 2}
            width={i === 0 ? 2 : i < 3 ? 2.2 : 2.4}
            height={height}
          />
        ))}
      </svg>
      Waneline
    </a>
  );
}
