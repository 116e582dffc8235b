/** Stands at the foot of every page on which numbers are read, and in print. */
export function Caution() {
  return (
    <footer className="caution">
      These figures support engineering judgement and do not replace it, nor that of a licensed engineer where
      the law asks for one. Flight, lifting and rotating machinery fall under the applicable codes: weigh
      before you rely on a number.
    </footer>
  );
}
