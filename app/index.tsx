import { Text, View } from 'react-native'

export default function StartScreen() {
  return (
    <View role="main">
      <Text role="heading">Tallystone</Text>
    </View>
  )
}
