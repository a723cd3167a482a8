import { useController, useWatch, type Control } from 'react-hook-form';
import { orderSchema, type OrderDto, type OrderRequest, type SavedOrderDto } from '../../contracts/orders';
import { Field } from '../ui/Field';
import { FormActions } from '../ui/form/FormActions';
import { NumberField } from '../ui/form/NumberField';
import { SelectInput, TextInput } from '../ui/form/TextInput';
import { useSave } from '../ui/form/useSave';
import { useZodForm, type Blank } from '../ui/form/useZodForm';
import { useUnits } from '../ui/units';
import { Button } from '../ui/Button';
import type { Orders } from './useOrders';

type Values = OrderRequest;

interface Props {
  readonly orders: Orders;
  /** null: a new one. */
  readonly order: OrderDto | null;
  readonly onClose: () => void;
  readonly onSaved: (number: string) => void;
}

const BLANK: Blank<OrderRequest> = {
  ...{
    number: '',
    productId: '',
    quantity: null,
    unit: 'cases',
    earliest: null,
    latestStart: null,
    due: '',
    priority: 1,
  },
};

/** An order typed in or edited where it stands. Enter saves, Escape leaves it. */
export function OrderForm({ orders, order, onClose, onSaved }: Props) {
  const start = order ? { ...BLANK, ...fieldsOf(order) } : BLANK;
  const form = useZodForm(orderSchema, start);
  const path = order ? `/api/orders/${order.id}` : '/api/orders';
  const save = useSave(
    form,
    (values: Values) => {
      const body = order ? { ...values, revision: order.revision } : values;
      return orders.change<SavedOrderDto>(path, { method: 'POST', body });
    },
    () => onSaved(form.getValues('number')),
  );
  const remove = useSave(
    form,
    () => orders.change(path, { method: 'DELETE' }),
    () => onSaved(''),
  );
  const isPlanned = order !== null && order.state.kind !== 'notPlanned';
  return (
    <form
      onSubmit={save.submit}
      noValidate
      aria-label={order ? `Order ${order.number}` : 'New order'}
      onKeyDown={(event) => {
        event.stopPropagation();
        if (event.key === 'Escape') onClose();
      }}
      className="bg-sunken px-4 pt-4 pb-3"
    >
      <OrderFields control={form.control} orders={orders} isPlanned={isPlanned} />
      <FormActions
        state={remove.state.kind === 'failed' ? remove.state : save.state}
        save={order ? 'Save the order' : 'Add the order'}
        onCancel={onClose}
      >
        {order && !isPlanned ? (
          <Button look="over" busy={remove.state.kind === 'saving'} onClick={() => remove.submit()}>
            Delete
          </Button>
        ) : null}
      </FormActions>
    </form>
  );
}

function fieldsOf(order: OrderDto): OrderRequest {
  const { number, productId, quantity, unit, earliest, latestStart, due, priority } = order;
  return { number, productId, quantity, unit, earliest, latestStart, due, priority };
}

interface FieldsProps {
  readonly control: Control<Values, unknown, Values>;
  readonly orders: Orders;
  readonly isPlanned: boolean;
}

function OrderFields({ control, orders, isPlanned }: FieldsProps) {
  const units = useUnits();
  const unit = useWatch({ control, name: 'unit' });
  const products = orders.data.products.map(({ id, name }) => ({ value: id, label: name }));
  const choices = [
    { value: 'cases', label: 'cases' },
    { value: 'kg', label: units.symbol('mass') },
  ];
  const fixed = isPlanned ? { hint: 'Planned: take it back to change it.', disabled: true } : {};
  return (
    <div className="grid gap-x-4 gap-y-1 sm:grid-cols-2 lg:grid-cols-4">
      <TextInput control={control} name="number" label="Order" maxLength={40} />
      <SelectInput
        {...{ control, ...fixed }}
        name="productId"
        label="Product"
        none="choose…"
        options={products}
        className="lg:col-span-2"
      />
      <div className="grid grid-cols-[minmax(0,1fr)_7rem] gap-2">
        <NumberField
          {...{ control, ...fixed }}
          name="quantity"
          label="Quantity"
          quantity={unit === 'kg' ? 'mass' : undefined}
        />
        <SelectInput control={control} name="unit" label="In" options={choices} disabled={isPlanned} />
      </div>
      <Moment control={control} name="earliest" label="Earliest start" />
      <Moment control={control} name="latestStart" label="Latest start" hint="Of raw material that spoils." />
      <Moment control={control} name="due" label="Due" />
      <NumberField control={control} name="priority" label="Priority" hint="1 is usual, 5 the most pressing." />
    </div>
  );
}

interface MomentProps {
  readonly control: Control<Values, unknown, Values>;
  readonly name: 'earliest' | 'latestStart' | 'due';
  readonly label: string;
  readonly hint?: string;
}

/** A day and time by the plant's clock; empty: none. */
function Moment({ control, name, label, hint }: MomentProps) {
  const { field, fieldState } = useController({ control, name });
  const { ref, value, onBlur, onChange } = field;
  const empty = name === 'due' ? '' : null;
  return (
    <Field
      {...{ label, hint, name }}
      ref={ref}
      type="datetime-local"
      error={fieldState.error?.message}
      value={value ?? ''}
      onBlur={onBlur}
      onChange={(event) => onChange(event.target.value === '' ? empty : event.target.value.slice(0, 16))}
    />
  );
}
