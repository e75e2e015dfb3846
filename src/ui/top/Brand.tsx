/** A leaning frame on its ground, and the name. */
export function Brand() {
  return (
    <div className="brand">
      <svg width="20" height="22" viewBox="0 0 20 22" aria-hidden="true">
        <g stroke="var(--ink)" fill="none">
          <path
            d="M3 21C3 18 4 17 4 14S6.5 10 6.5 7.5 9 4 9 2M12 21c0-3 1-4 1-7s2.5-4 2.5-6.5S18 4 18 2"
            strokeWidth="1.2"
          />
          <path d="M2.6 14h12M5.1 7.6h12M7.6 2h12" strokeWidth="2" />
        </g>
        <path d="M0 21.2h20" stroke="var(--accent)" strokeWidth="1.6" />
      </svg>
      <h1 className="word">Swaybook</h1>
    </div>
  );
}
