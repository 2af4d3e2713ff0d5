/** The mark of DESIGN: two choirs sharing one stroke. */
export function Mark({ size = 24 }: { size?: number }) {
  return (
    <svg viewBox="0 0 24 24" width={size} height={size} aria-hidden="true" className="flex-none">
      <path
        fill="currentColor"
        d="M2 3h11v3H2zM2 3h2v15H2zM6.5 3h2v11h-2zM11 3h2v18h-2zM11 18h11v3H11zM15.5 10h2v11h-2zM20 6h2v15h-2z"
      />
    </svg>
  );
}
