import type { Metadata } from "next";
import { PlainPage } from "@/app/(public)/_components/plain-page";
import { PageHead } from "@/app/_components/ui";
import { howComputedWords as words } from "@/lib/strings/how-computed";
import { example, fiveDecimals, fourDecimals, percent } from "./_components/example";
import { Fraction, SquareRoot, Step, WorkedOut } from "./_components/sums";

export const metadata: Metadata = { title: words.title };

export default function HowComputedPage() {
  return (
    <PlainPage>
      <PageHead title={words.title} subtitle={words.subtitle} />
      <p className="mb-3">{words.exampleNote}</p>
      <ol className="steps">
        <FromCounts />
        <FromSpread />
        <Step title={words.exact.title} text={words.exact.text} />
        <Step title={words.rules.title} text={words.rules.text} />
        <Step title={words.baseline.title} text={words.baseline.text} />
      </ol>
      <p className="care mt-3">{words.rounding}</p>
    </PlainPage>
  );
}

function FromCounts() {
  const { baseline, month, centre, rate } = example;
  return (
    <>
      <Step title={words.centre.title} text={words.centre.text}>
        <Fraction top={words.centre.top} bottom={words.centre.bottom} />
        <span>=</span>
        <Fraction top={baseline.events} bottom={baseline.discharges.toLocaleString("en-GB")} />
        <WorkedOut>= {fourDecimals(centre)}</WorkedOut>
      </Step>
      <Step title={words.rate.title} text={words.rate.text}>
        <Fraction top={month.events} bottom={month.discharges} />
        <WorkedOut>
          = {fourDecimals(rate)} = {percent(rate)}
        </WorkedOut>
      </Step>
    </>
  );
}

function FromSpread() {
  const { month, centre, rate, standardError, action, warning, leastToShowFall } = example;
  const centreText = fourDecimals(centre);
  const limits = (k: number, { lower, upper }: { lower: number; upper: number }) => (
    <WorkedOut>
      {centreText} ± {k} × {fiveDecimals(standardError)} = {percent(lower)} {words.limits.and}{" "}
      {percent(upper)}
    </WorkedOut>
  );
  return (
    <>
      <Step title={words.spread.title} text={words.spread.text}>
        <SquareRoot>
          <Fraction
            top={
              <WorkedOut>
                {centreText} × (1 − {centreText})
              </WorkedOut>
            }
            bottom={month.discharges}
          />
        </SquareRoot>
        <WorkedOut>= {fiveDecimals(standardError)}</WorkedOut>
      </Step>
      <Step title={words.limits.title} text={words.limits.text}>
        {limits(3, action)}
        {limits(2, warning)}
      </Step>
      <Step title={words.comparison.title} text={words.comparison.text}>
        <WorkedOut>
          {percent(warning.upper)} &lt; {percent(rate)} &lt; {percent(action.upper)}
        </WorkedOut>
      </Step>
      <Step title={words.blind.title} text={words.blind.text}>
        <span>9 ×</span>
        <Fraction
          top={<WorkedOut>1 − {centreText}</WorkedOut>}
          bottom={<WorkedOut>{centreText}</WorkedOut>}
        />
        <WorkedOut>= {leastToShowFall.toFixed(1)}</WorkedOut>
        <span>{words.blind.result(Math.ceil(leastToShowFall))}</span>
      </Step>
    </>
  );
}
