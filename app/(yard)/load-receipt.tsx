import { useLocalSearchParams } from 'expo-router'
import { LoadReceiptScreen } from '@/components/receipts/LoadReceiptScreen'

export default function LoadReceiptRoute() {
  return <LoadReceiptScreen address={useLocalSearchParams()} />
}
