/** The only heavy rule on the page: where the building stands. */
export function Ground({ margin }: { readonly margin: number }) {
  return (
    <svg className="ground" width="100%" height="12" role="img" aria-label="Ground line">
      <defs>
        <pattern id="ground-hatch" width="6" height="6" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <path d="M0 0V6" stroke="var(--ink2)" strokeWidth="1.1" />
        </pattern>
        <pattern id="over-hatch" width="4" height="4" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <rect width="4" height="4" fill="var(--signal)" />
          <path d="M0 0V4" stroke="var(--paper)" strokeWidth="1.4" />
        </pattern>
      </defs>
      <g style={{ transform: `translateX(${margin}px)` }}>
        <rect width={`calc(100% - ${2 * margin}px)`} height="9" fill="url(#ground-hatch)" />
        <rect y="-1" width={`calc(100% - ${2 * margin}px)`} height="2" className="f-ink" />
      </g>
    </svg>
  );
}
