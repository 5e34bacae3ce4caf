import { withThousands } from './describe-value';
import { eachSeries, type MeaningCheck } from './document-report';
import { statedQuantities } from './stated-quantities';

/** Most uncertain quantities that the parameters of one series may state. Published models have a dozen. */
const MOST_UNCERTAIN_QUANTITIES = 400;
/** Most numbers in the table of derivatives, points × uncertain quantities over all series; 64 MB of memory. */
const MOST_DERIVATIVES = 4_000_000;
/** Most labels of shared quantities in a dataset: their covariance is solved as one dense matrix. */
const MOST_LABELS = 400;

/**
 * A valid document must not ask for more memory and time than any laboratory's needs: what is computed grows
 * with points × uncertain quantities, and with the cube of the labels that series share.
 */
export const checkWork: MeaningCheck = (document, report) => {
  const labels = new Set<string>();
  let derivatives = 0;
  eachSeries(document, ({ parameters, points }, base) => {
    let uncertain = 0;
    for (const { statement } of statedQuantities(parameters)) {
      if (statement.u) uncertain += 1;
      if (statement.sharedAs !== undefined) labels.add(statement.sharedAs);
    }
    derivatives += uncertain * points.length;
    if (uncertain > MOST_UNCERTAIN_QUANTITIES)
      report(`${base}/parameters`, tooMany('uncertain quantities', MOST_UNCERTAIN_QUANTITIES, uncertain));
  });
  if (derivatives > MOST_DERIVATIVES)
    report('/series', tooMany('derivatives (points × uncertain quantities)', MOST_DERIVATIVES, derivatives));
  if (labels.size > MOST_LABELS)
    report('/series', tooMany('labels of shared quantities', MOST_LABELS, labels.size));
};

function tooMany(what: string, most: number, found: number): string {
  return `at most ${withThousands(most)} ${what} are computed; here are ${withThousands(found)}`;
}
