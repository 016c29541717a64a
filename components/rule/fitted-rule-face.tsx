import { RuleFace, type RuleFaceProps } from './rule-face';

/** A rule face cut for the room it finds: a phone's, a card's or a desk's. Only the one shown is heard. */
export function FittedRuleFace({ className, ...props }: Omit<RuleFaceProps, 'variant'>) {
  return (
    <div className={`@container ${className ?? ''}`}>
      <div className="@min-[560px]:hidden">
        <RuleFace {...props} variant="phone" />
      </div>
      <div className="hidden @min-[560px]:block @min-[920px]:hidden">
        <RuleFace {...props} variant="card" />
      </div>
      <div className="hidden @min-[920px]:block">
        <RuleFace {...props} variant="wide" />
      </div>
    </div>
  );
}
