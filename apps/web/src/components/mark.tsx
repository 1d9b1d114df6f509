/** Our mark: a beam on its fulcrum and the poise that hangs from it. Decorative; the name stands beside it in words. */
export function Mark({ size = 28 }: { size?: number }) {
  return (
    <svg width={size} height={size} viewBox="0 0 32 32" aria-hidden="true" focusable="false">
      <path d="M3 12.6 29 9.4" stroke="currentColor" strokeWidth="2.6" strokeLinecap="round" />
      <path d="M12.5 11.5 8.4 27h8.2z" fill="currentColor" />
      <path d="M23 10.2v4.6" stroke="var(--brass-on-structure)" strokeWidth="1.8" />
      <circle cx="23" cy="18.2" r="4.2" fill="var(--brass-on-structure)" />
    </svg>
  );
}
