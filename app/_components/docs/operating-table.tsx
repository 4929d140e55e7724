import { Cell, HeadCell, RowHead } from '../tables/cells';
import { Head, Row, Table } from '../tables/table';
import { Section } from '../ui/section';
import { Sym } from '../ui/symbols';

const measured = [
  { grids: 4, falseFails: '1.4 %', falsePasses: '0.8 %' },
  { grids: 5, falseFails: '0.2 %', falsePasses: '0' },
  { grids: 6, falseFails: '0', falsePasses: '0' },
] as const;

/** How often the rule errs, as the checks of the product measure it again. */
export function OperatingTable() {
  return (
    <Section
      heading="How often the rule errs"
      note={<p>20 000 drawn series each, formal order 2, halved spacing, coarsest <Sym>h</Sym> between 0.05 and 0.8.</p>}
    >
      <Table number={1} caption="Series of a true order 2 that fail, and series with a first-order part that pass, by number of grids.">
        <Head><tr><HeadCell>Grids</HeadCell><HeadCell num>False fails</HeadCell><HeadCell num>False passes</HeadCell></tr></Head>
        <tbody>
          {measured.map(({ grids, falseFails, falsePasses }) => (
            <Row key={grids}><RowHead>{grids}</RowHead><Cell num>{falseFails.replace(' ', '\u202f')}</Cell><Cell num>{falsePasses.replace(' ', '\u202f')}</Cell></Row>
          ))}
        </tbody>
      </Table>
      <p className="mt-3 max-w-[46em] text-graphite">
        Drawn errors are |<Sym>h</Sym><sup>2</sup>(1 + <Sym>ah</Sym> + <Sym>bh</Sym><sup>2</sup>)| with <Sym>a</Sym> and <Sym>b</Sym> normally distributed, standard
        deviations 2 and 4; and |<Sym>ah</Sym> + <Sym>h</Sym><sup>2</sup>| with |<Sym>a</Sym>| between 0.001 and 1, evenly in its logarithm, of either sign.
      </p>
    </Section>
  );
}
