/** Mantlet's own mark: a shield with the outline of a rolled section on it. The word always stands beside it. */
export function Mark({ size = 22 }: { size?: number }) {
  return (
    <svg width={size} height={size} viewBox="0 0 24 24" fill="none" stroke="currentColor" strokeWidth="1.8" aria-hidden="true" focusable="false">
      <path d="M3 3h18v9c0 5-4 8-9 10-5-2-9-5-9-10z" />
      <path d="M8 7.5h8M12 7.5v8M8 15.5h8" />
    </svg>
  );
}
