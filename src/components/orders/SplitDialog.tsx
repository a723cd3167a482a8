import { useState } from 'react';
import { daysAfter } from '../../calendar/dates';
import type { OrderDto, OrderProductDto, PlannedOrderDto } from '../../contracts/orders';
import { STAGE_NAMES } from '../../contracts/products';
import { PART_LOADS, piecesOf, type PartLoad } from '../../core/orders/amounts';
import { outAtOnce } from '../../core/orders/pace';
import { splitOrder, type OrderSplit } from '../../core/orders/split';
import { messageOf } from '../query/api';
import { groupDigits } from '../time';
import { Button } from '../ui/Button';
import { Dialog } from '../ui/Dialog';
import { SelectField } from '../ui/Field';
import { Notice } from '../ui/Notice';
import { useUnits } from '../ui/units';
import type { Orders } from './useOrders';
import { OFFER_NAMES, offerText, paceText, paceTitle, quantityText, stateText, wallText } from './words';

interface Props {
  readonly orders: Orders;
  readonly order: OrderDto;
  readonly onClose: () => void;
  readonly onPlanned: (message: string) => void;
}

/** What an order becomes: offered before it is planned, taken back afterwards. */
export function SplitDialog(props: Props) {
  const { order, orders, onClose } = props;
  const units = useUnits();
  const product = orders.data.products.find(({ id }) => id === order.productId);
  const title = `${order.number}: ${order.productName}, ${quantityText(order, units)}`;
  const isPlanned = order.state.kind !== 'notPlanned';
  return (
    <Dialog open title={title} onClose={onClose} wide>
      {isPlanned ? <Planned {...props} /> : product?.route ? <Offers {...props} product={product} /> : null}
      {!isPlanned && !product?.route ? (
        <Notice look="over">{units.message(product?.refusal ?? 'The product has been taken out of use.')}</Notice>
      ) : null}
    </Dialog>
  );
}

/** Sends a request of the dialog: what was refused stays in it. */
function useRequest(run: () => Promise<string>, onDone: (message: string) => void) {
  const [state, setState] = useState<{ busy: boolean; refusal: string }>({ busy: false, refusal: '' });
  const send = (): void => {
    setState({ busy: true, refusal: '' });
    run().then(onDone, (error: unknown) => setState({ busy: false, refusal: messageOf(error) }));
  };
  return { ...state, send };
}

function Offers({ orders, order, product, onPlanned }: Props & { readonly product: OrderProductDto }) {
  const [part, setPart] = useState<PartLoad>('levelled');
  const [weekStart, setWeekStart] = useState(order.dueWeek);
  const units = useUnits();
  const offers = PART_LOADS.flatMap((choice) => {
    const split = product.route && splitOrder(product.route, piecesOf(order.quantityKg, product.fillKg), choice);
    return split ? [{ choice, split }] : [];
  });
  const chosen = offers.find(({ choice }) => choice === part)?.split;
  const request = useRequest(async () => {
    const body = { revision: order.revision, part, weekStart };
    const done = await orders.change<PlannedOrderDto>(`/api/orders/${order.id}/plan`, { method: 'POST', body });
    const carried = done.carriedTo === null ? '' : ` The rest is order ${done.carriedTo}.`;
    return `${order.number}: ${done.activities} runs, batches and loads are in the week, not yet placed.${carried}`;
  }, onPlanned);
  return (
    <>
      <fieldset className="divide-y divide-rule border-y border-rule">
        <legend className="sr-only">What becomes of the part load</legend>
        {offers.map(({ choice, split }) => (
          <label key={choice} className="flex cursor-pointer gap-3 py-2.5">
            <input
              type="radio"
              name="part"
              className="mt-1 size-4.5 accent-room"
              checked={part === choice}
              disabled={!split.ok}
              onChange={() => setPart(choice)}
            />
            <span>
              <span className="block font-medium">{OFFER_NAMES[choice]}</span>
              <span className="text-sm text-ink-muted">{split.ok ? offerText(split.value) : split.error.message}</span>
            </span>
          </label>
        ))}
      </fieldset>
      {chosen?.ok ? <SplitFacts split={chosen.value} product={product} /> : null}
      <div className="mt-3 flex flex-wrap items-end justify-between gap-4 border-t border-rule pt-4">
        <SelectField label="Week" value={weekStart} onChange={(event) => setWeekStart(event.target.value)}>
          {[0, -7].map((days) => {
            const week = daysAfter(order.dueWeek, days);
            const which = days === 0 ? 'when it is due' : 'the week before';
            return (
              <option key={week} value={week}>
                {wallText(`${week}T00:00`).slice(0, -6)}: {which}
              </option>
            );
          })}
        </SelectField>
        <Button
          look="main"
          className="mb-5.5 min-h-10"
          busy={request.busy}
          disabled={!chosen?.ok}
          onClick={request.send}
        >
          Add to the week
        </Button>
      </div>
      {request.refusal === '' ? null : (
        <Notice look="over" live>
          {units.message(request.refusal)}
        </Notice>
      )}
    </>
  );
}

function SplitFacts({ split, product }: { readonly split: OrderSplit; readonly product: OrderProductDto }) {
  const units = useUnits();
  const { pieces, kg, batches, loads, runs, paces, pace } = split;
  const load = paces.find(({ stage }) => stage === 'retort' || stage === 'pasteurise');
  const loadsPerH = load?.piecesEach ? (60 * pace.piecesPerMin) / load.piecesEach : 0;
  const first = batches[0];
  return (
    <div className="mt-4 grid gap-x-8 gap-y-4 sm:grid-cols-2">
      <div>
        <h3 className="label mb-1">Split</h3>
        <ul className="text-md">
          <li>
            {groupDigits(pieces)} containers, {units.text('mass', kg)}
          </li>
          {first ? (
            <li>
              {batches.length} {batches.length === 1 ? 'kettle batch' : 'kettle batches'} of{' '}
              {units.text('mass', first.outKg)}
              {batches.length > 1 ? `, the last ${units.text('mass', batches.at(-1)?.outKg ?? 0)}` : ''}
            </li>
          ) : null}
          {runs.map((run) => (
            <li key={run.index}>
              {STAGE_NAMES[run.stage]}: {groupDigits(run.minutes)} min
              {run.minutes > Math.ceil(run.ownMin) + 1
                ? `, ${groupDigits(Math.ceil(run.ownMin))} min at its own rate`
                : ''}
            </li>
          ))}
          {loads.length > 0 ? <li>{offerText(split)}</li> : null}
        </ul>
      </div>
      <div>
        <h3 className="label mb-1">{paceTitle(pace)}</h3>
        <dl className="text-md">
          {paces.map((one, i) => (
            <div key={i} className={one === pace ? 'font-semibold' : ''}>
              <dt className="inline">{STAGE_NAMES[one.stage]}: </dt>
              <dd className="inline">{paceText(one)}</dd>
            </div>
          ))}
          {product.limits.map((limit, i) => (
            <div key={`limit-${i}`} className="text-ink-muted">
              <dt className="inline">{limit.name}, in the retort stage at that pace: </dt>
              <dd className="inline">
                {Math.ceil(outAtOnce(limit.amount, loadsPerH, limit.minutes / 60) * 10) / 10} {limit.unit}
              </dd>
            </div>
          ))}
        </dl>
      </div>
    </div>
  );
}

function Planned({ orders, order, onPlanned }: Props) {
  const units = useUnits();
  const { state } = order;
  const request = useRequest(async () => {
    await orders.change(`/api/orders/${order.id}/plan`, { method: 'DELETE' });
    return `${order.number} is taken back out of the week.`;
  }, onPlanned);
  return (
    <>
      <p className="text-md">
        {stateText(state)}.{' '}
        {state.weekStart === null ? null : (
          <a className="link" href={`/week/${state.weekStart}`}>
            Week of {wallText(`${state.weekStart}T00:00`).slice(0, -6)}
          </a>
        )}
      </p>
      <p className="mt-2 text-sm text-ink-muted">It can be taken back while nothing of it is placed.</p>
      {request.refusal === '' ? null : (
        <Notice look="over" live className="mt-3">
          {units.message(request.refusal)}
        </Notice>
      )}
      <div className="mt-4 flex justify-end">
        <Button look="over" busy={request.busy} disabled={state.placed > 0} onClick={request.send}>
          Take it back
        </Button>
      </div>
    </>
  );
}
