import type { Protocol } from '@weftway/pathway/protocol';
import { Section } from '../../../ui/page/section.tsx';
import { protocolWords } from '../../../words/protocol.ts';

export function ProtocolSettings({ protocol: { settings } }: { readonly protocol: Protocol }) {
  return (
    <Section title={protocolWords.settings}>
      <ul className="text-body m-0 list-none p-0">
        <li>{protocolWords.offersMolding(settings.offersMolding)}</li>
        {settings.offersMolding ? <li>{protocolWords.moldingClock(settings.moldingClock)}</li> : null}
        <li>{protocolWords.graftBounds(settings.graftRootLower, settings.graftRootUpper)}</li>
      </ul>
    </Section>
  );
}

export function ProtocolSources({ protocol: { sources } }: { readonly protocol: Protocol }) {
  return (
    <Section title={protocolWords.sources}>
      <p className="text-body text-ink-2 m-0 max-w-[72ch]">
        {protocolWords.commonPracticeNote} {protocolWords.notAdvice}
      </p>
      <dl className="text-small m-0 grid grid-cols-[3rem_minmax(0,72ch)] gap-y-1">
        {Object.entries(sources).map(([name, text]) => (
          <div key={name} className="contents">
            <dt className="text-ink-2 figures">[{name}]</dt>
            <dd className="m-0">{text}</dd>
          </div>
        ))}
      </dl>
    </Section>
  );
}
