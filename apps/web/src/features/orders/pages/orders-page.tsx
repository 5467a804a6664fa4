import { useSearchParams } from 'react-router-dom';
import type { OrderView } from '../../../shared/api/types.js';
import { useDarkroom } from '../../../shared/darkroom/darkroom-context.js';
import { ForRole } from '../../../shared/darkroom/for-role.js';
import { paths } from '../../../shared/routes/paths.js';
import { Fetched } from '../../../shared/ui/fetched.js';
import { PageHeading } from '../../../shared/ui/page-heading.js';
import { TabLinks } from '../../../shared/ui/tab-links.js';
import { useSuppliers } from '../../suppliers/api/get-suppliers.js';
import { SupplierList } from '../../suppliers/components/supplier-list.js';
import { useOrders } from '../api/get-orders.js';
import { OrderRows } from '../components/order-rows.js';
import { ToOrderList } from '../components/to-order-list.js';

const lists = {
  drafts: { words: 'Drafts', empty: 'No order is being drafted.', states: ['draft'] },
  'on-the-way': { words: 'On the way', empty: 'Nothing is on the way.', states: ['sent'] },
  closed: { words: 'Closed', empty: 'No order is closed yet.', states: ['received', 'cancelled'] },
} as const satisfies Record<string, { words: string; empty: string; states: OrderView['state'][] }>;
type List = keyof typeof lists;
const listNames = Object.keys(lists) as List[];

const within = (orders: readonly OrderView[], list: List): OrderView[] =>
  orders.filter(({ state }) => lists[list].states.some((one) => one === state));

function Orders() {
  const { address, zone } = useDarkroom();
  const [search] = useSearchParams();
  const query = useOrders();
  const suppliers = useSuppliers();
  const asked = search.get('show');
  const list = listNames.find((name) => name === asked);
  const count = (name: List): string => (query.data ? ` ${within(query.data.orders, name).length}` : '');
  const tabs = [
    { to: paths.orders(address), words: 'To order', current: !list && asked !== 'suppliers' },
    ...listNames.map((name) => ({
      to: paths.orders(address, name),
      words: `${lists[name].words}${name === 'closed' ? '' : count(name)}`,
      current: name === list,
    })),
    { to: paths.orders(address, 'suppliers'), words: 'Suppliers', current: asked === 'suppliers' },
  ];
  return (
    <>
      <PageHeading title="Orders" />
      <TabLinks label="Orders" tabs={tabs} />
      {list && (
        <Fetched query={query} what="the orders" zone={zone}>
          {({ orders }) => (
            <OrderRows label={lists[list].words} orders={within(orders, list)} empty={lists[list].empty} />
          )}
        </Fetched>
      )}
      {asked === 'suppliers' && (
        <Fetched query={suppliers} what="the suppliers" zone={zone}>
          {(data) => <SupplierList suppliers={data.suppliers} />}
        </Fetched>
      )}
      {!list && asked !== 'suppliers' && <ToOrderList />}
    </>
  );
}

export function OrdersPage() {
  return (
    <ForRole least="technician" what="Ordering">
      <Orders />
    </ForRole>
  );
}
