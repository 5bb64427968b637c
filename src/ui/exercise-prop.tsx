import type { Prop } from '#shared/plan/figure/drawing.ts';
import type { Spot } from '#shared/plan/figure/reach.ts';

type Place = (spot: Spot) => Spot;

const line = (place: Place, ...spots: Spot[]): string =>
  spots.map((spot, n) => `${n === 0 ? 'M' : 'L'}${place(spot).join(' ')}`).join('');

/** What stands about in a drawing: quieter than the figure. */
export function ExerciseProp({ prop, place }: { prop: Prop; place: Place }) {
  switch (prop.kind) {
    case 'wall': {
      const { at } = prop;
      const hatch = [30, 55, 80, 105, 130, 155]
        .map((up) => line(place, [at, up], [at + 8, up + 8]))
        .join('');
      return (
        <>
          <path d={line(place, [at, 0], [at, 176])} className="stroke-soft" strokeWidth="2" />
          <path d={hatch} className="stroke-edge" strokeWidth="1" />
        </>
      );
    }
    case 'chair': {
      const { at } = prop;
      return (
        <path
          d={
            line(place, [at, 96], [at - 1, 0]) +
            line(place, [at, 46], [at + 26, 46], [at + 26, 0]) +
            line(place, [at - 3, 96], [at + 3, 96])
          }
          className="stroke-soft"
          strokeWidth="2.4"
        />
      );
    }
    case 'step': {
      const { from, to, height } = prop;
      return (
        <path
          d={`${line(place, [from, 0], [from, height], [to, height], [to, 0])}Z`}
          className="fill-rule/60 stroke-soft"
        />
      );
    }
    case 'cushion': {
      const [x, y] = place([prop.at, 4]);
      return <rect x={x - 15} y={y - 3} width="30" height="7" rx="3.5" className="fill-rule" />;
    }
    case 'towel': {
      const [x, y] = place([prop.at, 3]);
      return <circle cx={x} cy={y} r="3.4" className="fill-rule" />;
    }
    case 'stick':
      return (
        <path
          d={line(place, [prop.at, 0], [prop.at, prop.height])}
          className="stroke-soft"
          strokeWidth="2.4"
        />
      );
    case 'rail': {
      const post = ([x, up]: Spot) => line(place, [x, 0], [x, up]);
      return (
        <path
          d={line(place, prop.from, prop.to) + post(prop.from) + post(prop.to)}
          className="stroke-soft"
          strokeWidth="2.4"
        />
      );
    }
    case 'mark': {
      const [x, y] = place(prop.at);
      const [inner] = place([prop.at[0] - 9, prop.at[1]]);
      const outwards = Math.sign(x - inner);
      return (
        <>
          <path d={`M${inner} ${y}H${x}`} className="stroke-ink" strokeWidth="3" />
          <text
            x={x + 3 * outwards}
            y={y + 4}
            textAnchor={outwards > 0 ? 'start' : 'end'}
            stroke="none"
            className="fill-ink text-[12px] font-bold"
          >
            {prop.text}
          </text>
        </>
      );
    }
  }
}
