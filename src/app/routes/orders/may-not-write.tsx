import { Link } from 'react-router-dom'
import { orderListWords, orderViewWords } from '../../../../shared/messages/orders-screens.ts'
import { paths } from '../../../lib/paths.ts'
import { Cartouche } from '../../../ui/cartouche.tsx'
import { Area, Sheet } from '../../../ui/sheet.tsx'

/** In place of the form, for those who may not write or where nothing may be written. */
export function MayNotWrite({ why, number }: { why: string; number?: string }) {
  return (
    <Sheet>
      <Area>
        <Cartouche
          place={<Link to={paths.orders()}>{orderListWords.title}</Link>}
          title={orderViewWords.kind}
          source={number === undefined ? undefined : <Link to={paths.order(number)}>{number}</Link>}
        />
        <p className="pane">{why}</p>
      </Area>
    </Sheet>
  )
}
