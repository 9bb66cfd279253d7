import { Disclosure } from '@/components/ui/disclosure';
import { ENOUGH_DIGITS } from '@/lib/checks/digits';

/** What the words on the page mean, and what was left out and why. */
export function ReadingNotes() {
  return (
    <Disclosure summary="How to read this, and what was left out">
      <ul className="grid max-w-3xl list-disc gap-1.5 pl-5 text-ink-2">
        <li>
          A value agrees when ours, rounded to the printed digits, is the printed one. Digits are counted by
          the log relative error, −log₁₀(|ours − published| / |published|), and never beyond those printed. Of
          values printed with more than {ENOUGH_DIGITS} digits, {ENOUGH_DIGITS} are enough: a computer’s
          numbers carry 15 to 16, and data made to be hard cost some of them.
        </li>
        <li>
          “Seen in print”: the value was read in a public copy of the source. “Typed from memory”: it was not
          met again; that it agrees shows that data and value belong together. “Identity”: it follows from a
          formula and was worked out apart from the engine.
        </li>
        <li>
          Left out, because print and its own data differ in the last digit: the residual standard deviation
          0.4329 and the standard deviation of the intercept 0.2950 of the fluorescein line (0.43285 and
          0.29494 from its data), and Grubbs’ values for 3, 7, 8 and 15. Left out as a misprint: u = 0.19 dm²
          for the area in example A5.
        </li>
      </ul>
    </Disclosure>
  );
}
