import { ActionLink } from '@/components/ui/action-link';
import { actionStyle } from '@/components/ui/action-style';
import { HomeRow } from './home-row';

/** What goes in, what comes out, for scripts, and what it is not. */
export function HomeRows() {
  return (
    <>
      <HomeRow
        title="What you bring"
        where={
          <ActionLink href="/check" prefetch={false}>
            Check data
          </ActionLink>
        }
      >
        Activities against ligand concentration, for any number of variants and conditions, and the parameters
        you claim for them: energy gaps, sites, dissociation constants, modulators. Each in your own unit and
        orientation, as a JSON document or as a CSV table with a short form beside it.
      </HomeRow>
      <HomeRow
        title="What comes out"
        where={
          <ActionLink href="/methods#flags" prefetch={false}>
            Residual and flags
          </ActionLink>
        }
      >
        For every point its coordinate in kT, the activity that your statements predict, the residual in
        standard uncertainties of measurement and parameters together, and a flag: on curve, warning, off
        curve. For every series and for the whole a test of the collapse, and how many flags chance alone
        would give.
      </HomeRow>
      <HomeRow
        title="From a script"
        where={
          <a href="/api/v1/openapi.json" className={actionStyle()}>
            API description
          </a>
        }
      >
        The same call answers programs: send the document to <code>POST /api/v1/assessments</code>. Nobody
        signs in, and nothing is stored.
      </HomeRow>
      <HomeRow
        title="What it is not"
        where={
          <ActionLink href="/methods#not-judged" prefetch={false}>
            What is not yet judged
          </ActionLink>
        }
      >
        Not a fit: your parameters are taken as stated. Not a verdict on a protein: a missed curve can lie in
        the data, in a statement or in the model. And never a basis for diagnosis, dosing or safety decisions.
      </HomeRow>
    </>
  );
}
