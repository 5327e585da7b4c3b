export { OrdersList, ordersAsked } from './orders-list.tsx'
export { orderTitle, SignedOrder, UnsignedOrder } from './order-view.tsx'
export { orderQuery, ordersCsvAddress, ordersKey } from './queries.ts'
