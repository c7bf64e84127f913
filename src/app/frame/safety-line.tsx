/** Stands under every screen, and on every sheet that is printed. */
export const SafetyLine = () => (
  <footer className="border-t border-rule">
    <p className="mx-auto max-w-[1240px] px-4 py-4 text-small text-pencil sm:px-6">
      <strong className="font-semibold text-ink">At the bench.</strong> Computed values are an aid to people who know
      the work; they authorise nothing. Sets hold high voltage, and stored charge after they are switched off; old parts
      may hold toxic materials. Transmitting needs a licence. Airworthy and safety-of-life equipment needs a licensed
      release.
    </p>
  </footer>
);
