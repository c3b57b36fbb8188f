/** The kerf: a ring with one narrow cut. Decorative beside the name; give it a title where it stands alone. */
export function Mark({ size = 20, title }: { size?: number; title?: string }) {
  return (
    <svg width={size} height={size} viewBox="0 0 32 32" role={title ? 'img' : undefined} aria-label={title} aria-hidden={title ? undefined : true}>
      <path d="M21.9 5.2A12.2 12.2 0 1 0 26.2 9.2" fill="none" stroke="var(--cut)" strokeWidth="4.4" />
    </svg>
  );
}
