import { StockScreen } from '@/components/stock/StockScreen'

export default function StockRoute() {
  return <StockScreen />
}
